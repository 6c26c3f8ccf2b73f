import Papa from 'papaparse';
import readWorkbook from 'read-excel-file/universal';
import { describe, expect, it } from 'vitest';
import { sourceOf } from '../../../../tests/support/export-source.ts';
import { statesCoverage } from '../../../../tests/support/sheets.ts';
import { limitsOf, themeClasses, type Theme } from '../measures/index.ts';
import { sheetTheme } from '../sheet/index.ts';
import { exportFile, furtherColumns, type ExportKindId, type ExportSource } from './index.ts';

const coverage = statesCoverage();
const [noData, suppressed] = [4, 7];
const values = coverage.keys.map((_, i) =>
	i === noData ? null : i === suppressed ? 31_337 : 60_000 + ((i * 37_511) % 900_000),
);
const asked: Theme = {
	...{ measure: 'visits', per: { kind: 'none' }, isRate: true, method: 'quantiles' },
	...{ classes: 5, breaks: [], rounded: true, ramp: 'viridis', reversed: false, middle: null },
	...{ suppressBelow: 50_000, title: 'Visits in a year', figuresInFiles: true },
};
const ground = { values, areasKm2: coverage.areasKm2, denominators: null };
const theme = { ...asked, breaks: limitsOf(asked, ground) };
const classes = themeClasses(theme, ground);
const shown = sheetTheme(theme, classes, { table: null, date: null, holds: true });
const territories = coverage.keys.map((_, i) =>
	i % 3 === 0 ? null : { key: `t${i % 3}`, name: i % 3 === 1 ? '=1+1' : '@SUM(A1)' },
);

function sourceWith(more: Parameters<typeof furtherColumns>[1], themed = true): ExportSource {
	const source = sourceOf(coverage, themed ? { theme: shown } : {});
	return { ...source, columns: furtherColumns(source.rows, more) };
}

async function bytesOf(kind: ExportKindId, source: ExportSource): Promise<Uint8Array> {
	const outcome = await exportFile(kind, source);
	if (outcome.status === 'refused') throw new Error(outcome.message);
	return outcome.file.bytes;
}
const textOf = async (kind: ExportKindId, source: ExportSource) =>
	new TextDecoder().decode(await bytesOf(kind, source));

/** By the limits alone: a figure on a limit is in the lower class. */
const classBy = (figure: number) => theme.breaks.filter((limit) => figure > limit).length + 1;

type Features = { features: { properties: Record<string, unknown> }[] };

describe('a themed sheet whose figures files may carry', () => {
	// handed in unsuppressed on purpose: a region without a class must not be told all the same
	const source = sourceWith({ territories: null, figures: { title: theme.title, values } });

	it('tells value, class and range that agree with the limits', async () => {
		const { features } = JSON.parse(await textOf('geojson', source)) as Features;
		features.forEach(({ properties }, i) => {
			if (i === noData || i === suppressed) return;
			expect(properties.value).toBe(values[i]);
			expect(properties.class).toBe(classBy(values[i]!));
			expect(properties.range).toBe(classes.ranges[classBy(values[i]!) - 1]);
		});
		expect(features[noData].properties).toMatchObject({
			...{ value: null, class: null, range: 'no data' },
		});
		expect(features[suppressed].properties).toMatchObject({
			...{ value: null, class: null, range: 'suppressed' },
		});
	});

	it('tells the same in TopoJSON, CSV and the workbook', async () => {
		const { features } = JSON.parse(await textOf('geojson', source)) as Features;
		const told = features.map(({ properties: { class: one, range, value } }) => [
			...[one, range, value],
		]);
		const topology = JSON.parse(await textOf('topojson', source)) as {
			objects: { regions: { geometries: { properties: Record<string, unknown> }[] } };
		};
		expect(
			topology.objects.regions.geometries.map(({ properties }) => [
				...[properties.class, properties.range, properties.value],
			]),
		).toEqual(told);
		const csv = Papa.parse<string[]>((await textOf('csv', source)).trim()).data;
		expect(csv[0].slice(-3)).toEqual(['class', 'range', 'value (Visits in a year)']);
		expect(csv.slice(1).map((line) => line.slice(-3))).toEqual(
			told.map((line) => line.map((one) => (one === null ? '' : String(one)))),
		);
		const sheets = await readWorkbook(new Blob([(await bytesOf('xlsx', source)).slice()]));
		const [head, ...rows] = sheets[0].data as unknown[][];
		expect(head.slice(-3)).toEqual(csv[0].slice(-3));
		expect(rows.map((row) => row.slice(-3))).toEqual(told);
	});
});

describe('columns that a sheet has not', () => {
	it('are left out: figures of a theme that keeps them, territories of a sheet without', async () => {
		const kept = await textOf('csv', sourceWith({ territories: null, figures: null }));
		expect(kept.split('\r\n')[0]).toMatch(/area km2,class,range$/);
		const plain = sourceWith({ territories: null, figures: { title: 'x', values } }, false);
		expect(plain.columns).toEqual([]);
	});
});

describe('territories', () => {
	const source = sourceWith({ territories, figures: null }, false);

	it('are columns of every table, as texts that no spreadsheet runs', async () => {
		const csv = Papa.parse<string[]>((await textOf('csv', source)).trim()).data;
		expect(csv[0].slice(-2)).toEqual(['territory', 'territory name']);
		// OWASP, CSV Injection: fields that begin with = + - @
		expect(csv[2].slice(-2)).toEqual(['t1', "'=1+1"]);
		expect(csv[3].slice(-2)).toEqual(['t2', "'@SUM(A1)"]);
		expect(csv[1].slice(-2)).toEqual(['', '']);
		const sheets = await readWorkbook(new Blob([(await bytesOf('xlsx', source)).slice()]));
		expect((sheets[0].data as unknown[][])[2].slice(-2)).toEqual(['t1', '=1+1']);
	});

	it('are properties of every region in files of boundaries', async () => {
		const { features } = JSON.parse(await textOf('geojson', source)) as Features;
		features.forEach(({ properties }, i) => {
			expect(properties.territory).toBe(territories[i]?.key ?? null);
			expect(properties.territoryName).toBe(territories[i]?.name ?? null);
		});
	});
});
