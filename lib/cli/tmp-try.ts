import { estimateNest } from '@/lib/brood/estimate-nest';
import { spiral } from '@/lib/comb/walk';
const day=86400000;
function comb(c: Record<string, number>){ const st=Object.entries(c).flatMap(([s,n])=>Array(n).fill(s)); return spiral(st.length).map((a,i)=>({...a,state:st[i]})); }
const at=Date.parse('2026-06-16T09:35:00Z');
const t=process.cpuUsage(); const w=performance.now();
const e=estimateNest({nest:'n',zone:'America/New_York',asOf:at,taxon:'Polistes fuscatus',readings:[{id:'a',at,marks:comb({capped:6,parasitised:1,large:7,medium:3,small:6,egg:10}) as never}]});
console.log('cpu ms',process.cpuUsage(t).user/1000, 'wall', performance.now()-w);
for (let i=0;i<3;i++){const t=process.cpuUsage();const w=performance.now();estimateNest({nest:'n',zone:'America/New_York',asOf:at,taxon:'Polistes fuscatus',readings:[{id:'a',at,marks:comb({capped:6,parasitised:1,large:7,medium:3,small:6,egg:10}) as never}]});console.log('cpu ms',process.cpuUsage(t).user/1000,'wall', performance.now()-w);}
console.log(e.nest.founded, e.nest.firstEmergence, e.nest.rateMultiplier, e.nest.season, e.nest.expectedLosses, e.information, e.flags);
for (const c of e.cells.filter((_,i)=>[0,5,6,8,15,20,32].includes(i))) console.log(c.state,c.generation,c.laid?.p95,c.laid?.median,c.capped?.median,c.emerges?.p95,c.emerges?.median,c.emerges?.probability,c.lost);
console.log(e.nest.emergencePerDay.slice(0,20).map(d=>d.expected.toFixed(2)+`[${d.lo80},${d.hi80}]`).join(' '));
