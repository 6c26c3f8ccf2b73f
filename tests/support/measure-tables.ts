import writeExcelFile, { type SheetData } from 'write-excel-file/universal';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Workshop } from '../../src/lib/server/jobs/workshop.ts';
import { uploadTable } from '../../src/lib/server/services/measure-upload.service.ts';
import { ingest, uploadRequest } from './workshop.ts';

/** Six invented parishes in a row, with keys that begin with a zero as many official codes do. */
export const parishes: [key: string, name: string][] = [
	['01', 'Ashby'],
	['02', 'Bellmoor'],
	['03', 'Corran'],
	['04', 'Dunwick'],
	['05', 'Élan'],
	['06', 'Fairlea'],
];

/** Squares side by side, one a pair of key and name. */
export const squaresGeoJson = (regions: readonly [key: string, name: string][]): string =>
	JSON.stringify({
		type: 'FeatureCollection',
		features: regions.map(([code, name], at) => ({
			type: 'Feature',
			properties: { code, name },
			geometry: {
				type: 'Polygon',
				coordinates: [
					[
						[at, 0],
						[at + 1, 0],
						[at + 1, 1],
						[at, 1],
						[at, 0],
					],
				],
			},
		})),
	});

/** A sheet of these regions. @returns its number */
export async function squaresSheet(
	shop: Workshop,
	member: Member,
	regions: readonly [key: string, name: string][] = parishes,
): Promise<number> {
	const fields = { keyField: 'code', nameField: 'name' };
	const bytes = squaresGeoJson(regions);
	const status = await ingest(shop, member, 'parishes.geojson', bytes, fields);
	if (status.sheet === null) throw new Error(`no sheet came of it: ${status.refusal?.message}`);
	return status.sheet;
}

export const csv = (rows: readonly (string | number)[][]): string =>
	rows.map((row) => row.join(',')).join('\r\n');

/** A workbook with one sheet, or several by name; numbers stay numbers, texts stay texts. */
export async function xlsx(
	sheets: Record<string, readonly (string | number | null)[][]>,
): Promise<Uint8Array> {
	const pages = Object.entries(sheets).map(([sheet, rows]) => ({
		sheet,
		data: rows.map((row) => row.map((value) => (value === null ? null : { value }))) as SheetData,
	}));
	const blob = await writeExcelFile(pages).toBlob();
	return new Uint8Array(await blob.arrayBuffer());
}

/** Uploads a table to a sheet; answers its number. */
export async function upload(
	shop: Workshop,
	member: Member,
	sheet: number,
	fileName: string,
	bytes: string | Uint8Array,
	fields: Record<string, string> = {},
): Promise<number> {
	const request = uploadRequest(fileName, bytes, fields);
	return (await uploadTable(shop, member, sheet, request)).number;
}
