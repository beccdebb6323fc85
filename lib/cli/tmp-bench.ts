import { estimateNest } from '@/lib/brood/estimate-nest';
import { seededRandom } from '@/lib/kit/random';
import { spiral } from '@/lib/comb/walk';
const day=86400000;
// 40 cells all with unique histories x 20 visits
const [cells, visits] = [Number(process.argv[2]??40), Number(process.argv[3]??20)];
const order=['egg','small','medium','large','capped','opened'] as const; const dur=[11,10,3.3,6.7,14,5];
const rnd=seededRandom(5); const t0=Date.parse('2026-05-20T09:00:00Z');
const sp=spiral(cells); const laid=sp.map((_,i)=>-20+i*0.9*40/cells*1+rnd()*3);
const readings=Array.from({length:visits},(_,v)=>{const d=v*5.3+rnd(); return {id:'v'+v,at:t0+d*day,marks:sp.map((c,i)=>{let a=d-laid[i]!; if(a<0) return null; a%=55; let s=0; let acc=0; while(s<5&&a>acc+dur[s]!){acc+=dur[s]!;s++;} const st = rnd()<0.05? order[Math.max(0,s-1)]!:order[s]!; return {...c,state:st};}).filter(x=>x!==null)}});
for(let k=0;k<Number(process.argv[4]??2);k++){const c=process.cpuUsage();const w=performance.now();const e=estimateNest({nest:'n',zone:'UTC',asOf:readings.at(-1)!.at,taxon:null,readings: readings as never});
console.log('cpu',(process.cpuUsage(c).user/1e6).toFixed(2),'wall',((performance.now()-w)/1e3).toFixed(2),'rss MB',(process.memoryUsage().rss/1e6).toFixed(0), e.nest.rateMultiplier, e.nest.founded?.p95, e.flags.filter(f=>f.code==='contradictory').length);}
