import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { edgesOfCol } from '../../../../tests/support/named-graphs.ts';
import { statesCoverage } from '../../../../tests/support/sheets.ts';
import { bordersForSheet, bordersOf, sheetBorderRows, withGaps } from '../borders/index.ts';
import { exportBordersCol, exportBordersCsv, type BordersOut } from './index.ts';

const read = (bytes: Uint8Array) => new TextDecoder().decode(bytes);
const none = { pointTouches: false, leastMetres: 0, waterKm: null, struck: [], added: [] };
const coverage = statesCoverage();
const { keys, names } = coverage;
const number = (name: string) => names.indexOf(name);
const key = (name: string) => keys[number(name)];
const michigan = [number('Michigan'), number('Illinois')].sort((a, b) => a - b);
/** The states with one gap measured: Michigan and Illinois, across the lake. */
const borders = withGaps(keys.length, bordersOf(coverage), {
	a: Uint32Array.of(michigan[0]),
	b: Uint32Array.of(michigan[1]),
	metres: Float64Array.of(61_234.567),
	at: Float64Array.of(-87.2, 41.9),
});
const given: BordersOut = { title: 'The states', keys, names, borders, rules: none };

/** Rows by an independent reader of the same standard. */
function rowsOf(bytes: Uint8Array): Record<string, string>[] {
	const { data, errors } = Papa.parse<Record<string, string>>(read(bytes), {
		header: true,
		skipEmptyLines: true,
	});
	expect(errors).toEqual([]);
	return data;
}

describe('borders as CSV', () => {
	it('lists every pair, and says of each whether it counts', () => {
		const rows = rowsOf(exportBordersCsv(given));
		// Knuth, TAOCP 4 fasc. 0: 107 line borders; two more meet at the four-state corner
		expect(rows.filter(({ kind }) => kind === 'line')).toHaveLength(107);
		expect(rows.filter(({ kind }) => kind === 'point')).toHaveLength(2);
		expect(rows.filter(({ counts }) => counts === 'yes')).toHaveLength(107);
		const across = rows.find(({ kind }) => kind === 'water')!;
		expect(across).toMatchObject({ 'gap (m)': '61234.57', 'shared line (m)': '', counts: 'no' });
		expect(across['why not']).toBe('across water does not count');
	});

	it('carries what was decided by hand, and nothing that a spreadsheet would run', () => {
		const rules = {
			...none,
			waterKm: 70,
			struck: [
				{
					...{ a: key('Utah'), b: key('Idaho'), reason: '=HYPERLINK("x")', by: '+Mallory' },
					at: '2026-12-01T10:00:00Z',
				},
			],
			added: [{ a: key('Utah'), b: key('New Mexico'), reason: 'one, "two"\nthree' }],
		};
		const rows = rowsOf(exportBordersCsv({ ...given, rules }));
		const of = (one: string, other: string) =>
			rows.find(
				(row) => [row.name, row['other name']].sort().join() === [one, other].sort().join(),
			)!;
		expect(of('Utah', 'Idaho')).toMatchObject({
			...{ counts: 'no', 'why not': 'struck out by hand', 'by hand': 'struck' },
			...{ reason: `'=HYPERLINK("x")`, by: "'+Mallory", on: '2026-12-01' },
		});
		expect(of('Utah', 'New Mexico')).toMatchObject({
			...{ kind: 'point', counts: 'yes', 'by hand': 'added', reason: 'one, "two"\nthree' },
		});
		expect(of('Michigan', 'Illinois')).toMatchObject({ counts: 'yes', 'why not': '' });
	});

	it('is the same byte for byte', () => {
		expect(read(exportBordersCsv(given))).toBe(read(exportBordersCsv(structuredClone(given))));
	});
});

describe('borders as a graph', () => {
	it('holds those that count, and is read by whoever reads DIMACS files', () => {
		const graph = edgesOfCol(read(exportBordersCol(given)));
		expect(graph.regions).toBe(49);
		expect(graph.borders.a).toHaveLength(107);
		const rules = { ...none, waterKm: 62, pointTouches: true };
		const more = edgesOfCol(read(exportBordersCol({ ...given, rules })));
		expect(more.borders.a).toHaveLength(110);
		const counted = bordersForSheet(keys, borders, rules);
		expect(more.borders).toEqual({ a: [...counted.a], b: [...counted.b] });
	});

	it('says how many edges follow, and which number is which key', () => {
		const lines = read(exportBordersCol({ ...given, title: 'e 1 2\nand\u2028more' })).split('\n');
		expect(lines[0]).toBe('c Borders that count on the sheet "e 1 2\\nand\\u2028more"');
		expect(lines.filter((line) => line.startsWith('e '))).toHaveLength(107);
		expect(lines).toContain('p edge 49 107');
		expect(lines[number('Ohio') + 2]).toBe(`c ${number('Ohio') + 1} "${key('Ohio')}" "Ohio"`);
		expect(lines.at(-1)).toBe('');
	});
});

describe('the rows of a sheet', () => {
	it('agree with the borders that count, whatever the rules', () => {
		const pairs = [
			{ a: key('Utah'), b: key('Idaho'), reason: '' },
			{ a: key('Maine'), b: key('Florida'), reason: '' },
			{ a: key('Arizona'), b: key('Colorado'), reason: '' },
		];
		for (const pointTouches of [true, false])
			for (const leastMetres of [0, 100_000])
				for (const waterKm of [null, 0, 10, 100])
					for (const [struck, added] of [
						[pairs, []],
						[[], pairs],
						[pairs, pairs],
					]) {
						const rules = { pointTouches, leastMetres, waterKm, struck, added };
						const counted = bordersForSheet(keys, borders, rules);
						const rows = sheetBorderRows(keys, borders, rules);
						const counting = rows.filter(({ standing }) => standing === 'counts');
						expect(counting.map(({ a, b }) => [a, b])).toEqual(
							Array.from(counted.a, (a, i) => [a, counted.b[i]]),
						);
					}
	});
});
