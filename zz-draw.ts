import { writeFileSync, readdirSync } from 'node:fs';
import { Resvg } from '@resvg/resvg-js';
import { drawSheet, paintSvg } from '/work/wt/frame/src/lib/engines/sheet/index.ts';
import { sheetOf, layout, worldCoverage, statesCoverage } from '/work/wt/frame/tests/support/sheets.ts';
import { coverageFrom } from '/work/wt/frame/tests/support/coverage.ts';
import { topologyOf } from '/work/wt/frame/tests/support/atlas.ts';
const root='/work/wt/frame/node_modules/@expo-google-fonts/';
const fontFiles: string[]=[];
for (const fam of ['source-serif-4','sofia-sans-semi-condensed']) for (const w of ['400Regular','700Bold','400Regular_Italic']) { try { for (const f of readdirSync(root+fam+'/'+w)) if (f.endsWith('.ttf')) fontFiles.push(root+fam+'/'+w+'/'+f);} catch {} }
const world10=(names: string[])=>coverageFrom(topologyOf('world-atlas','countries-10m.json'),'countries',{key:(_,id,i)=>`${id}-${i}`,keep:({name})=>names.includes(String(name))});
const usAll=()=>coverageFrom(topologyOf('us-atlas','states-10m.json'),'states',{keep:(_,id)=>!['60','66','69','72','78'].includes(id)});
const usEvery=()=>coverageFrom(topologyOf('us-atlas','states-10m.json'),'states',{});
const F=layout.frame;
const full={...F,insets:'auto' as const,graticule:{step:'auto' as const,figures:true},neatLine:true,northArrow:true,sea:'#dfe9ee',lakes:'#dfe9ee'};
const cases: Record<string,()=>any>={
 us:()=>[usAll(),{paper:'A4',frame:full}],
 usp:()=>[usAll(),{paper:'A4',orientation:'portrait',frame:full}],
 usevery:()=>[usEvery(),{paper:'A3',frame:full}],
 states:()=>[statesCoverage(),{paper:'A4',frame:full}],
 fiji:()=>[world10(['Fiji','Tonga']),{paper:'A4',frame:full}],
 japan:()=>[world10(['Japan']),{paper:'A4',orientation:'portrait',frame:full}],
 indonesia:()=>[world10(['Indonesia']),{paper:'A3',frame:full}],
 chile:()=>[world10(['Chile']),{paper:'A4',orientation:'portrait',frame:full}],
 norway:()=>[world10(['Norway']),{paper:'A4',orientation:'portrait',frame:full}],
 norwayl:()=>[world10(['Norway']),{paper:'A4',frame:full}],
 france:()=>[world10(['France']),{paper:'A4',frame:full}],
 world:()=>[worldCoverage(),{paper:'A3',frame:full}],
 world150:()=>[worldCoverage(),{paper:'A3',projection:'equal-earth',frame:{...full,centre:[150,0]}}],
 worldcyl:()=>[worldCoverage(),{paper:'A3',projection:'cylindrical-equal-area',frame:full}],
 russia:()=>[world10(['Russia']),{paper:'A4',frame:full}],
 antarctica:()=>[world10(['Antarctica']),{paper:'A4',frame:full}],
 greenland:()=>[world10(['Greenland']),{paper:'A4',orientation:'portrait',frame:full}],
 africa:()=>[worldCoverage(['South Africa','Namibia','Botswana','Zimbabwe','Mozambique','eSwatini']),{paper:'A1',frame:full}],
 spain:()=>[world10(['Spain','Portugal']),{paper:'A5',frame:full}],
 mercator:()=>[world10(['Spain','Portugal','France']),{paper:'A4',projection:'mercator',frame:full}],
 small:()=>[world10(['Luxembourg']),{paper:'A4',orientation:'portrait',frame:full}],
};
for (const name of process.argv.slice(2)) {
 const t=performance.now();
 const [coverage,change]=cases[name]();
 const t1=performance.now();
 const d=drawSheet(sheetOf(coverage,{layout:{...layout,title:name,subtitle:'frame trial',...change}}));
 const t2=performance.now();
 const svg=paintSvg(d,{fills:'attribute'});
 writeFileSync(`/tmp/frame/${name}.svg`,svg);
 const r=new Resvg(svg,{font:{fontFiles,loadSystemFonts:false},fitTo:{mode:'width',value:1400}});
 writeFileSync(`/tmp/frame/${name}.png`,r.render().asPng());
 console.log(name,Math.round(t2-t1),'ms',JSON.stringify({...d.frame,clusters:undefined}),'\n  ',d.notes.projection,d.notes.scale);
 for(const c of d.frame.clusters) console.log('   ',c.id,'|',c.name,Math.round(c.areaKm2),c.place,c.suits,c.speck?'speck':'',c.ratio??'',c.cornerMm??'');
}
