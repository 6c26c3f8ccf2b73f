import { caution } from '../../sheet/layout.ts';
import { borderTable } from '../borders.ts';
import type { DataColumn, DataTable } from '../data-table.ts';
import type { ExportSource } from '../source.ts';
import { hatchWords } from './hatch-words.ts';

const text = (heading: string): DataColumn => ({ heading, kind: 'text' });
const number = (heading: string, unit?: string): DataColumn => ({ heading, unit, kind: 'number' });
const km2 = (area: number): number => Math.round(area * 100) / 100;

/** A line a region in region order: what the map shows of it, then the further columns. */
export function regionTable({ rows, columns }: Pick<ExportSource, 'rows' | 'columns'>): DataTable {
	return {
		name: 'Regions',
		columns: [
			...['key', 'name', 'group'].map(text),
			number('ink number'),
			...['ink', 'hex'].map(text),
			number('area', 'km²'),
			...columns.map(({ heading, unit, kind }): DataColumn => ({ heading, unit, kind })),
		],
		rows: rows.map((row) => [
			...[row.key, row.name, row.group, row.inkNumber, row.inkName, row.hex, km2(row.areaKm2)],
			...columns.map(({ values }) => values[row.region]),
		]),
	};
}

/** A line an ink, in the order of the legend, with how many regions have it and their area. */
export function inkTable({ drawing, rows }: Pick<ExportSource, 'drawing' | 'rows'>): DataTable {
	return {
		name: 'Inks',
		columns: [
			...[number('number'), text('name'), text('hex'), text('hatch')],
			...[number('regions'), number('area', 'km²')],
		],
		rows: drawing.inks.map(({ name, hex, hatch }, ink) => {
			const having = rows.filter(({ inkNumber }) => inkNumber === ink + 1);
			const area = having.reduce((sum, { areaKm2 }) => sum + areaKm2, 0);
			return [ink + 1, name, hex, hatch ? hatchWords(hatch) : null, having.length, km2(area)];
		}),
	};
}

export function aboutTable({ drawing, about, rows }: ExportSource): DataTable {
	return {
		name: 'About',
		columns: [text('what'), text('value')],
		rows: [
			...[
				['sheet', about.title],
				['issue', about.issue],
				['team', about.author],
			],
			['date (UTC)', about.date.slice(0, 10)],
			['content digest (SHA-256)', about.digest],
			['regions', String(rows.length)],
			...[
				['projection', drawing.notes.projection],
				['scale', drawing.notes.scale],
			],
			...[
				['boundaries', about.credits],
				['caution', caution],
			],
		],
	};
}

/** Every worksheet of the workbook. */
export const sheetTables = (source: ExportSource): DataTable[] => [
	...[regionTable(source), inkTable(source)],
	...(source.borders ? [borderTable(source.borders)] : []),
	aboutTable(source),
];
