import { evaluateLoad } from '/work/main/src/domain/load/evaluate-load';
import { judge } from '/work/main/src/domain/load/rules/judge';
import { sceneOf } from '/work/main/src/domain/load/rules/scene';
import { rules } from '/work/main/src/domain/load/rules/all-rules';
import { defaultPolicy } from '/work/main/src/domain/load/policy';
import { aLoad, inSlot, onLower, onUpper } from '/work/main/tests/support/load-builder';
function cart(n:number){
  let l=aLoad(); const racks=[] as string[];
  let k=0;
  // racks along both shelves
  const shelves = ['upper','lower'];
  if(n>60){ const s=Array.from({length:Math.ceil(n/40)},(_,i)=>({id:'s'+i,level:i+1,name:'S'+i,placeCode:'s',widthMm:560 as any,depthMm:1150 as any,clearHeightMm:340 as any,surface:'wire' as const,greatestMassKg:60 as any,isUsable:true})); l=l.with({cart:{id:'c',code:'c',name:'c',shelves:s}}); shelves.length=0; shelves.push(...s.map(x=>x.id)); }
  for(const s of shelves) for(const [x,y] of [[20,30],[290,30],[20,400],[290,400],[20,770],[290,770]]) { const id='R'+(k++); racks.push(id); l=l.withHolder(id,'RS',{shelf:s,x:x!,y:y!}); }
  for(let i=0;i<n;i++){ l=l.withPackage(['P-01','P-02','P-03','P-04'][i%4]!, inSlot(racks[Math.floor(i/7)]!, i%7+1)); }
  return l.build();
}
for(const n of [60,200,500]){
  const v=cart(n); 
  console.log(n, evaluateLoad(v,defaultPolicy).map(f=>f.title).slice(0,3));
  for(let i=0;i<300;i++) judge(sceneOf(v,defaultPolicy));
  const t:number[]=[]; for(let i=0;i<500;i++){const a=performance.now(); evaluateLoad(v,defaultPolicy); t.push(performance.now()-a);} t.sort((a,b)=>a-b);
  console.log('p50',t[250]!.toFixed(3),'p99',t[495]!.toFixed(3));
  const sc=performance.now(); for(let i=0;i<200;i++) sceneOf(v,defaultPolicy); console.log('scene', ((performance.now()-sc)/200).toFixed(3));
  const s=sceneOf(v,defaultPolicy); void s.nearPairs;
  const costs=rules.map(r=>{const a=performance.now(); for(let i=0;i<200;i++) r.find(s); return [r.id,(performance.now()-a)/200] as const}).sort((a,b)=>b[1]-a[1]).slice(0,8);
  console.log(costs.map(([id,c])=>id+' '+c.toFixed(4)).join(', '));
}
