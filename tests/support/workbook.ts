import { strToU8, zipSync } from 'fflate';

/** A workbook put together part by part, for what a library would not write. */
export interface HandMade {
	/** XML of `sheetData` and what follows it, by sheet name */
	sheets: Record<string, string>;
	/** XML of `si` elements */
	strings?: string;
	/** number formats written out, by id from 164, and the format of each cell style */
	formats?: { codes?: Record<number, string>; cells: number[] };
	from1904?: boolean;
	/** parts to replace or add, before packing */
	parts?: Record<string, Uint8Array>;
}

const main = 'xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"';
const relations = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const declared = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>';

const escaped = (text: string) => text.replace(/[&<>"]/g, (c) => `&#${c.charCodeAt(0)};`);

export function handMade(book: HandMade): Uint8Array {
	const names = Object.keys(book.sheets);
	const parts: Record<string, string> = {
		'[Content_Types].xml': `${declared}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"/>`,
		'_rels/.rels': `${declared}<Relationships><Relationship Id="r" Type="${relations}/officeDocument" Target="/xl/workbook.xml"/></Relationships>`,
		'xl/workbook.xml': `${declared}<workbook ${main} xmlns:r="${relations}"><workbookPr date1904="${book.from1904 ? 1 : 0}"/><sheets>${names
			.map((name, i) => `<sheet name="${escaped(name)}" sheetId="${i + 1}" r:id="s${i}"/>`)
			.join('')}</sheets></workbook>`,
		'xl/_rels/workbook.xml.rels': `${declared}<Relationships>${names
			.map(
				(_, i) =>
					`<Relationship Id="s${i}" Type="${relations}/worksheet" Target="worksheets/s${i}.xml"/>`,
			)
			.join(
				'',
			)}<Relationship Id="t" Type="${relations}/sharedStrings" Target="sharedStrings.xml"/><Relationship Id="y" Type="${relations}/styles" Target="styles.xml"/></Relationships>`,
		'xl/sharedStrings.xml': `${declared}<sst ${main}>${book.strings ?? ''}</sst>`,
		'xl/styles.xml': styles(book.formats ?? { cells: [0] }),
	};
	names.forEach((name, i) => {
		parts[`xl/worksheets/s${i}.xml`] =
			`${declared}<worksheet ${main}>${book.sheets[name]}</worksheet>`;
	});
	const bytes = Object.entries(parts).map(([name, xml]) => [name, strToU8(xml)] as const);
	return zipSync({ ...Object.fromEntries(bytes), ...book.parts });
}

function styles({
	codes = {},
	cells,
}: {
	codes?: Record<number, string>;
	cells: number[];
}): string {
	const formats = Object.entries(codes)
		.map(([id, code]) => `<numFmt numFmtId="${id}" formatCode="${escaped(code)}"/>`)
		.join('');
	const xfs = cells.map((id) => `<xf numFmtId="${id}"/>`).join('');
	return `${declared}<styleSheet ${main}><numFmts>${formats}</numFmts><cellStyleXfs><xf numFmtId="14"/></cellStyleXfs><cellXfs>${xfs}</cellXfs></styleSheet>`;
}

/** Rows of texts and numbers as `sheetData`, texts written in place, without addresses. */
export const sheetData = (rows: (string | number | null)[][]): string =>
	`<sheetData>${rows.map((row) => `<row>${row.map(cellXml).join('')}</row>`).join('')}</sheetData>`;

function cellXml(cell: string | number | null): string {
	if (cell === null) return '<c/>';
	if (typeof cell === 'number') return `<c><v>${cell}</v></c>`;
	return `<c t="inlineStr"><is><t xml:space="preserve">${escaped(cell)}</t></is></c>`;
}
