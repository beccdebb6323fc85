import { test } from 'vitest';
import { simulate } from '@/tests/support/sim/simulate';
test('x', async () => {
  const from = Number(process.env.FROM ?? 1), n = Number(process.env.N ?? 20);
  const t=performance.now(); let bad=0, saved=0, req=0, res=0;
  const kinds:Record<string,number>={};
  for (let s=from;s<from+n;s++){ const r=await simulate(s); saved+=r.saved;req+=r.requests;res+=r.restores; if(r.violations.length){bad++; for(const v of r.violations) kinds[v.invariant]=(kinds[v.invariant]??0)+1; if(bad<6) console.log(s, r.restores, r.violations.slice(0,4));} }
  console.log({bad,n,saved,req,res,kinds,ms:performance.now()-t});
}, 600000);
