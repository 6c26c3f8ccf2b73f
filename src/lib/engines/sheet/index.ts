/** From a coverage and a colouring to one drawn sheet, and from the drawing to SVG. */
export { drawPlaced, drawSheet, inksInUse, uncoloured, type SheetInput } from './draw-sheet.ts';
export { sheetTheme, unlessTold, type ThemeSource } from './sheet-theme.ts';
export { themeColumns, type SheetTheme, type ThemeColumns } from './themed.ts';
export { textBlocks } from './collar/text-blocks.ts';
export { doubledBorders } from './doubled-borders.ts';
export { recolour } from './recolour.ts';
export { regionSizesMm } from './sizes.ts';
export { sheetTable, type SheetRow } from './table.ts';
export { paintSvg, type SvgOptions } from './svg/paint-svg.ts';
export { type EmbeddedFace } from './svg/style-block.ts';
export { elementId } from './svg/element-id.ts';
export { chooseProjection } from './plane/choose-projection.ts';
export { extentOf, type Extent } from './plane/extent.ts';
export { type Placement } from './place-on-paper.ts';
export {
	boxOfRegion,
	groundOf,
	meets,
	regionPath,
	type Area,
	type Ground,
} from './canvas/ground.ts';
export {
	paintArea,
	traceRegion,
	type Colours,
	type Outline,
	type Pen,
	type Picture,
} from './canvas/paint-area.ts';
export { firstPicture, type FirstPicture } from './first-picture/first-picture.ts';
export { decodeFirstPicture, encodeFirstPicture } from './first-picture/first-picture-bytes.ts';
export { paintFirstPicture } from './first-picture/paint-first-picture.ts';
export { type Hatching } from './canvas/paint-hatches.ts';
export { refineGround } from './canvas/refine.ts';
export { regionAt } from './canvas/region-at.ts';
export { type ChosenProjection } from './plane/projections.ts';
export { paperLimits, paperSize } from './paper.ts';
export { caution, papers, wholeLayout, type SheetLayout } from './layout.ts';
export { shapeLayers, shapeLayersTop, type DrawnShape, type ShapeLayer } from './shapes.ts';
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
	SheetThemed,
} from './drawing.ts';
export type { ClusterReport, FrameReport } from './frame-report.ts';
