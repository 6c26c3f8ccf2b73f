import { gzipSync } from 'node:zlib';
import { encodeCoverage, type Coverage } from '../../src/lib/engines/boundaries/index.ts';
import type { BorderList } from '../../src/lib/engines/borders/index.ts';
import { exportFile, type ExportKindId } from '../../src/lib/engines/exports/index.ts';
import { checkPalette, mendPalette } from '../../src/lib/engines/palettes/index.ts';
import {
	drawSheet,
	groundOf,
	recolour,
	sheetTable,
	type SheetInput,
} from '../../src/lib/engines/sheet/index.ts';
import { faceFiles } from '../../src/lib/server/jobs/faces.ts';
import { packedLevels } from '../../src/lib/server/jobs/display-levels.work.ts';
import { rasterise } from '../../src/lib/server/jobs/rasterise.ts';
import { fractalText } from '../support/fractal-land.ts';
import { accepted } from '../support/read-boundaries.ts';
import { countiesCoverage, inks, layout, sheetOf } from '../support/sheets.ts';
import { Stopwatch } from './alone/stopwatch.ts';

const lands: Record<string, () => Promise<Coverage>> = {
	'3,142 counties': async () => countiesCoverage(),
	'33,000 regions': async () => {
		const land = { regions: 33_000, inner: 10, seed: 1 };
		const text = [...fractalText(land)].join('');
		return (await accepted(new TextEncoder().encode(text))).coverage;
	},
};

const hatch = { kind: 'lines', angle: 45, spacingMm: 1, widthMm: 0.15, hex: '#333333' } as const;
const paper = { ...layout, paper: 'A3' as const };

/**
 * A sheet drawn, recoloured and written as files: milliseconds of processor time, which other programs do
 * not lengthen, beside those of the clock; sizes of the files; the most memory. Names of lands may be given.
 */
export async function* run(): AsyncGenerator<object> {
	for (const [name, read] of Object.entries(lands)) {
		const input = sheetOf(await read(), { inks, layout: paper });
		for await (const record of sheet(input)) yield { land: name, ...record };
	}
}

async function* sheet(input: SheetInput): AsyncGenerator<object> {
	const { coverage } = input;
	yield { name: 'geometry', regions: coverage.keys.length, ...geometry(coverage) };
	yield (await timed('drawn without names', () => drawSheet(without(input)))).record;
	const { value: drawing, record } = await timed('drawn with names', () => drawSheet(input));
	yield { ...record, names: drawing.texts.filter(({ region }) => region !== undefined).length };
	const hatched = { ...without(input), inks: input.inks.map((ink) => ({ ...ink, hatch })) };
	yield (await timed('drawn with every ink hatched', () => drawSheet(hatched))).record;
	yield (await timed('ground for a canvas', () => groundOf(drawing))).record;
	const again = Int32Array.from(input.colouring!, (ink) => (ink + 1) % inks.length);
	yield (await timed('recoloured', () => recolour(drawing, again, input.inks, 'deutan'))).record;
	const source = {
		...{ drawing, coverage, columns: [], borders: null, fonts: faceFiles(), about },
		rows: sheetTable(drawing, coverage, input.groups),
	};
	for (const kind of ['svg', 'svgz', 'pdf', 'png', 'geojson', 'topojson', 'csv', 'xlsx'] as const) {
		yield await written(kind, source);
	}
	yield* palette(input.borders, input.colouring!);
	yield { name: 'memory', peakMegabytes: Math.round(process.resourceUsage().maxRSS / 1024) };
}

const without = (input: SheetInput): SheetInput => ({
	...input,
	layout: { ...input.layout, labels: false },
});

const about = {
	...{ title: 'Bench', issue: 'Edition 1, 1 December 2026', date: '2026-12-01T00:00:00.000Z' },
	...{ author: 'Bench', digest: null, credits: '', stem: 'bench', language: 'en' },
};

async function written(kind: ExportKindId, source: Parameters<typeof exportFile>[1]) {
	const { value, record } = await timed(kind, () => exportFile(kind, source, {}, { rasterise }));
	if (value.status === 'refused') return { ...record, refused: value.message };
	return { ...record, kilobytes: kilo(value.file.bytes) };
}

/** What the browser is sent: the levels of display, and the whole. */
function geometry(coverage: Coverage) {
	const levels = packedLevels(coverage).map(({ geometry: bytes }) => kilo(gzipSync(bytes)));
	return { levelKilobytes: levels, wholeKilobytes: kilo(gzipSync(encodeCoverage(coverage))) };
}

async function* palette(borders: BorderList, colouring: Int32Array): AsyncGenerator<object> {
	const hexes = inks.map(({ hex }) => hex);
	const pairs = new Set(
		Array.from(borders.a, (a, i) => pair(colouring[a], colouring[borders.b[i]])),
	);
	const touching = [...pairs].map((text) => text.split(' ').map(Number) as [number, number]);
	yield (await timed('palette checked', () => checkPalette(hexes, touching))).record;
	const asked = { inks: hexes, touching, locked: [] };
	yield (await timed('palette mended', () => mendPalette(asked))).record;
}

const pair = (a: number, b: number) => `${Math.min(a, b)} ${Math.max(a, b)}`;
const kilo = (bytes: Uint8Array) => Math.round(bytes.byteLength / 1000);

async function timed<T>(name: string, work: () => T | Promise<T>) {
	const watch = new Stopwatch();
	const value = await work();
	return { value, record: { name, ...watch.taken() } };
}
