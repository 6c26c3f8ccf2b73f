/** Everything that runs in a thread, by name: called through a `Pool`, in the web process and the worker. */
export { writeBorders } from './border-files.work.ts';
export { readRulesTable, writeRules } from './rules-csv.work.ts';
export { arrangeDraft, colourDraft, recheck } from './colour.work.ts';
export { compareEditions } from './compare-editions.work.ts';
export { paintFirst } from './first-picture.work.ts';
export { makeExport } from './export.work.ts';
export { findPieces } from './pieces.work.ts';
export { writeProof } from './proof.work.ts';
export { measureGaps } from './gaps.work.ts';
export { inkTerritories } from './ink-territories.work.ts';
export { paintSheet, renderFiles } from './paint.work.ts';
export { judgePlan, rebalancePlan } from './rebalance.work.ts';
export { readFile } from './read.work.ts';
export { readRecutFile } from './recut.work.ts';
export { searchLonger } from './search.work.ts';
export { carryRecut } from './recut-carry.work.ts';
export { sheetBordersJson } from './checks/sheet-borders.work.ts';
export { checkBoundariesFile } from './checks/check-boundaries.work.ts';
export { checkColouringJson } from './checks/check-colouring.work.ts';
export { checkProofJson } from './checks/check-proof.work.ts';
export { checkPaletteJson } from './checks/check-palette.work.ts';
export { checkTerritoriesJson } from './checks/check-territories.work.ts';
export { sealEdition } from './seal.work.ts';
export {
	nearestRegions,
	readMeasureTable,
	reviewMeasureTable,
	takeMeasureTable,
} from './measures.work.ts';
export { scratchPlan } from './scratch.work.ts';
export { findEdge } from './tie-ground.work.ts';
export { unitColumns } from './unit-columns.work.ts';
