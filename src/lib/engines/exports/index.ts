/** A sheet or an edition as files of every kind in `kinds.ts`. Bytes out, the same for the same input. */
export { exportSvg, type FaceFiles } from './svg.ts';
export { exportGeoJson } from './geojson.ts';
export { exportBordersCol, exportBordersCsv, type BordersOut } from './borders.ts';
export { csvField, exportCsv } from './csv.ts';
export { furtherColumns } from './further-columns.ts';
export { subsetFont } from './subset-font.ts';
export { exportTableCsv, type DataColumn, type DataTable } from './data-table.ts';
export { exportWorkbook } from './workbook.ts';
export { exportProofZip } from './proof-files.ts';
export { exportFile } from './export-file.ts';
export {
	dpiLimits,
	exportKind,
	exportKinds,
	pixelLimit,
	plainOptions,
	quantumLimits,
	type ExportKind,
	type ExportKindId,
	type ExportOptions,
	type SingleKindId,
	type SvgFileOptions,
} from './kinds.ts';
export type {
	ExportAbout,
	ExportedFile,
	ExportOutcome,
	ExportSource,
	ExportTools,
	ExtraColumn,
	FurtherValues,
} from './source.ts';
export { exportPdf } from './pdf/pdf.ts';
export { pixelsOf } from './png/png.ts';
