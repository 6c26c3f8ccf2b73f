import { createHash } from 'node:crypto';
import Papa from 'papaparse';
import readWorkbook from 'read-excel-file/universal';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { hatchedInks, hostileSource, sourceOf } from '../../../../tests/support/export-source.ts';
import { statesCoverage } from '../../../../tests/support/sheets.ts';
import { zipEntries } from '../../../../tests/support/zip-entries.ts';
import { rasterise } from '../../server/jobs/rasterise.ts';
import { caution } from '../sheet/layout.ts';
import {
	exportFile,
	exportKinds,
	type ExportedFile,
	type ExportKindId,
	type ExportOptions,
	type ExportSource,
} from './index.ts';
import { territoryColumns } from './territory-columns.ts';

const columnsOf = (regions: number) => [
	...territoryColumns(
		Array.from({ length: regions }, (_, i) =>
			i % 4 ? { key: `t${i % 3}`, name: `=Territory ${i % 3}` } : null,
		),
	),
	{
		...{ id: 'class', heading: 'class', kind: 'number' as const },
		values: Array.from({ length: regions }, (_, i) => i % 5 || null),
	},
	{
		...{ id: 'rate', heading: 'accounts', unit: 'per 1,000 km²', kind: 'number' as const },
		values: Array.from({ length: regions }, (_, i) => (i === 5 ? Number.NaN : i / 4)),
	},
];

const source = sourceOf(
	statesCoverage(),
	{ inks: hatchedInks },
	{ columns: columnsOf(statesCoverage().keys.length) },
);

const hostile = hostileSource();
const bare = sourceOf(statesCoverage(), { colouring: null });

async function made<K extends ExportKindId>(
	id: K,
	from: ExportSource,
	options: Partial<ExportOptions[K]> = {},
): Promise<ExportedFile> {
	const outcome = await exportFile(id, from, options, { rasterise });
	if (outcome.status === 'refused') throw new Error(outcome.message);
	return outcome.file;
}

const small = (id: ExportKindId) => (id === 'png' ? { dpi: 72 } : {});
const text = (bytes: Uint8Array) => new TextDecoder('utf-8', { fatal: true }).decode(bytes);

describe('every kind of file', () => {
	it.each(exportKinds.map(({ id }) => id))('%s is the same bytes on another day', async (id) => {
		const first = await made(id, source, small(id));
		vi.useFakeTimers({ now: new Date('2031-07-04T05:06:07Z'), toFake: ['Date'] });
		try {
			const again = await made(id, structuredCloned(source), small(id));
			expect(Buffer.compare(again.bytes, first.bytes)).toBe(0);
			expect(again.name).toBe(
				`corran-edition-4.${exportKinds.find((one) => one.id === id)!.extension}`,
			);
		} finally {
			vi.useRealTimers();
		}
	});

	it.each(exportKinds.map(({ id }) => id))('%s is made of hostile names', async (id) => {
		const file = await made(id, hostile, small(id));
		expect(file.bytes.length).toBeGreaterThan(100);
		expect(file.name).toMatch(/^[a-z0-9.-]+$/);
	});

	it.each(exportKinds.map(({ id }) => id))('%s is made of a sheet without inks', async (id) => {
		expect((await made(id, bare, small(id))).bytes.length).toBeGreaterThan(100);
	});

	it('says what it cannot do', async () => {
		for (const steps of [0, 999, 1e9, 1000.5, Number.NaN]) {
			const outcome = await exportFile('topojson', source, { steps });
			expect(outcome).toMatchObject({ status: 'refused', reason: 'bad-option' });
		}
		expect(await exportFile('zip', source, { kinds: [] })).toMatchObject({ status: 'refused' });
		await expect(exportFile('png', source, { dpi: 72 })).rejects.toThrow(TypeError);
	});
});

/** A copy that shares nothing, so that no file rests on what an earlier one left behind. */
const structuredCloned = (given: ExportSource): ExportSource => structuredClone(given);

describe('the workbook, read by read-excel-file 9.3.17', () => {
	const read = async (from: ExportSource) => {
		const { bytes } = await made('xlsx', from);
		const sheets = await readWorkbook(new Blob([bytes.slice()]));
		return new Map(sheets.map(({ sheet, data }) => [sheet, data as unknown[][]]));
	};

	it('has regions, inks, borders and what the sheet is', async () => {
		const sheets = await read(source);
		expect([...sheets.keys()]).toEqual(['Regions', 'Inks', 'Borders', 'About']);
		const [head, ...regions] = sheets.get('Regions')!;
		expect(head).toEqual([
			...['key', 'name', 'group', 'ink number', 'ink', 'hex', 'area (km²)'],
			...['territory', 'territory name', 'class', 'accounts (per 1,000 km²)'],
		]);
		expect(regions.map(([key]) => key)).toEqual(source.coverage.keys);
		expect(regions[1].slice(7)).toEqual(['t1', '=Territory 1', 1, 0.25]);
		expect(regions[3][9]).toBe(3);
		const [, ...inks] = sheets.get('Inks')!;
		expect(inks.map(([number, name]) => [number, name])).toEqual(
			hatchedInks.map(({ name }, i) => [i + 1, name]),
		);
		expect(inks.reduce((sum, row) => sum + Number(row[4]), 0)).toBe(49);
		// Knuth, TAOCP 4 fasc. 0: 107 line borders among the 48 states and the District
		expect(sheets.get('Borders')!.filter((row) => row[4] === 'line').length).toBe(107);
		expect(sheets.get('About')!.map(([, value]) => value)).toContain(caution);
	});

	it('keeps hostile names as text and runs none', async () => {
		const sheets = await read(hostile);
		const names = sheets.get('Regions')!.map(([, name]) => name);
		expect(names).toContain('=HYPERLINK("http://evil.example")');
		const { bytes } = await made('xlsx', hostile);
		const parts = zipEntries(bytes).filter(({ name }) => name.endsWith('.xml'));
		expect(parts.length).toBeGreaterThan(5);
		for (const part of parts) expect(part.bytes.toString('utf8')).not.toMatch(/<f[ >]/);
	});
});

describe('rows and features', () => {
	it('carry territories and classes in CSV, by papaparse 5.7.1', async () => {
		const { bytes } = await made('csv', source, { byteOrderMark: false });
		const { data, errors } = Papa.parse<Record<string, string>>(text(bytes), {
			...{ header: true, skipEmptyLines: true },
		});
		expect(errors).toEqual([]);
		expect(data[1]).toMatchObject({
			territory: 't1',
			'territory name': "'=Territory 1",
			class: '1',
		});
		expect(data[3]).toMatchObject({ class: '3', 'accounts (per 1,000 km²)': '0.75' });
		expect(data[4]).toMatchObject({ territory: '', 'territory name': '' });
	});

	it('carry them in GeoJSON and TopoJSON under names of letters', async () => {
		const { features } = JSON.parse(text((await made('geojson', source)).bytes));
		expect(features[3].properties).toMatchObject({
			...{ territory: 't0', territoryName: '=Territory 0', class: 3, rate: 0.75 },
		});
		expect(features[5].properties).toMatchObject({ class: null, rate: null });
		const topology = JSON.parse(text((await made('topojson', source)).bytes));
		expect(topology.objects.regions.geometries[3].properties).toEqual(features[3].properties);
	});

	it('refuse two columns of one name', async () => {
		const twice = { ...source, columns: [{ ...source.columns[0], id: 'hex' }] };
		await expect(exportFile('geojson', twice)).rejects.toThrow(RangeError);
	});
});

describe('the package', () => {
	const kinds = ['pdf', 'svg', 'geojson', 'csv', 'tokens', 'css'] as const;
	let entries: ReturnType<typeof zipEntries> = [];
	const steps: string[] = [];

	beforeAll(async () => {
		const tools = { rasterise, progress: (step: string) => void steps.push(step) };
		const outcome = await exportFile('zip', source, { kinds: [...kinds] }, tools);
		if (outcome.status === 'refused') throw new Error(outcome.message);
		entries = zipEntries(outcome.file.bytes);
	}, 120_000);

	it('has the very files that are made one by one, and says how far it is', async () => {
		const files = entries.slice(0, kinds.length);
		for (const [i, id] of kinds.entries()) {
			const { name, bytes } = await made(id, source);
			expect(files[i].name).toBe(name);
			expect(Buffer.compare(files[i].bytes, bytes)).toBe(0);
		}
		expect(steps.length).toBe(kinds.length);
	});

	it('lists the digest of each, by the SHA-256 of Node', () => {
		const list = entries.at(-1)!;
		expect(list.name).toBe('SHA-256.txt');
		const lines = entries
			.slice(0, -1)
			.map(({ name, bytes }) => `${createHash('sha256').update(bytes).digest('hex')}  ${name}\n`);
		expect(list.bytes.toString('utf8')).toBe(lines.join(''));
	});

	it('says what it holds, and the caution', () => {
		const readMe = entries.find(({ name }) => name === 'read-me.txt')!.bytes.toString('utf8');
		expect(readMe).toContain(caution);
		for (const { name } of entries.slice(0, kinds.length)) expect(readMe).toContain(name);
	});
});
