/** From a coverage and a colouring to one drawn sheet, and from the drawing to SVG. */
export { drawSheet, inksInUse, uncoloured, type SheetInput } from './draw-sheet.ts';
export { recolour } from './recolour.ts';
export { regionSizesMm } from './sizes.ts';
export { sheetTable, type SheetRow } from './table.ts';
export { paintSvg, type SvgOptions } from './svg/paint-svg.ts';
export { type EmbeddedFace } from './svg/style-block.ts';
export { elementId } from './svg/element-id.ts';
export { chooseProjection } from './plane/choose-projection.ts';
export { extentOf, type Extent } from './plane/extent.ts';
export { type ChosenProjection } from './plane/projections.ts';
export { paperLimits, paperSize } from './paper.ts';
export { caution, papers, type SheetLayout } from './layout.ts';
export { cutRing } from './plane/cut-open.ts';
export { ringLonLat, type LonLat } from './plane/ring-lonlat.ts';
export { isSetIn, textWidth } from './type/text-width.ts';
export { faceStyles, type Face } from './type/face.ts';
export type {
	DrawnInk,
	DrawnRect,
	DrawnText,
	Drawing,
	LegendPlace,
	LineLayer,
	RegionFill,
} from './drawing.ts';
