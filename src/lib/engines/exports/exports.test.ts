import { readFileSync } from 'node:fs';
import { geoArea } from 'd3-geo';
import type { FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson';
import { SaxesParser } from 'saxes';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inks, sheetOf, statesCoverage, worldCoverage } from '../../../../tests/support/sheets.ts';
import type { Coverage } from '../boundaries/coverage.ts';
import { drawSheet, faceStyles, sheetTable, type Face } from '../sheet/index.ts';
import { csvField, exportCsv, exportGeoJson, exportSvg, type FaceFiles } from './index.ts';

const text = (bytes: Uint8Array) => new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);

function rowsOf(coverage: Coverage) {
	const sheet = sheetOf(coverage);
	return sheetTable(drawSheet(sheet), coverage, sheet.groups);
}

/** Fields of a CSV file by the grammar of RFC 4180, section 2; throws where it is broken. */
function readCsv(csv: string): string[][] {
	const lines: string[][] = [];
	let at = 0;
	while (at < csv.length) {
		const fields: string[] = [];
		for (;;) {
			const field = /"((?:[^"]|"")*)"|[^",\r\n]*/y;
			field.lastIndex = at;
			const [raw, quoted] = field.exec(csv)!;
			fields.push(quoted === undefined ? raw : quoted.replaceAll('""', '"'));
			at += raw.length;
			if (csv[at] !== ',') break;
			at++;
		}
		if (csv.slice(at, at + 2) !== '\r\n') throw new Error(`no line end at ${at}`);
		at += 2;
		lines.push(fields);
	}
	return lines;
}

describe('CSV', () => {
	it('has a line a region and reads back', () => {
		const coverage = statesCoverage();
		const rows = rowsOf(coverage);
		const [head, ...lines] = readCsv(text(exportCsv(rows)));
		expect(head).toEqual(['key', 'name', 'group', 'ink number', 'ink', 'hex', 'area km2']);
		expect(lines.length).toBe(49);
		lines.forEach(([key, name, , number, ink, hex], i) => {
			expect([key, name]).toEqual([coverage.keys[i], coverage.names[i]]);
			expect(inks[Number(number) - 1]).toEqual({ name: ink, hex });
		});
		expect(text(exportCsv(rows, { byteOrderMark: true })).startsWith('\ufeffkey,')).toBe(true);
	});

	it('never lets a text begin a formula, and loses nothing', () => {
		// OWASP, CSV Injection: fields that begin with = + - @ tab or carriage return
		for (const attack of ['=1+1', '+cmd|x', '-2+3', '@SUM(A1)', '\t=1', '\r=1', '＝1']) {
			expect(csvField(attack)).toMatch(/^"?'/);
		}
		expect(csvField('-12.5')).toBe('-12.5');
		const list = fc.array(fc.string({ unit: 'binary', maxLength: 20 }), { minLength: 1 });
		fc.assert(
			fc.property(list, (values) => {
				const [back] = readCsv(`${values.map(csvField).join(',')}\r\n`);
				const read = back.map((value, i) => (value === `'${values[i]}` ? values[i] : value));
				expect(read).toEqual(values);
			}),
		);
	});
});

type Areas = FeatureCollection<Polygon | MultiPolygon, Record<string, unknown>>;

const polygons = ({ type, coordinates }: Polygon | MultiPolygon): Position[][][] =>
	type === 'Polygon' ? [coordinates] : coordinates;

function ringFaults(ring: Position[], outer: boolean, name: unknown): string[] {
	let twice = 0;
	ring.slice(1).forEach(([x, y], i) => (twice += ring[i][0] * y - x * ring[i][1]));
	const far = ring.some(([lon], i) => i > 0 && Math.abs(lon - ring[i - 1][0]) > 180);
	const away = ring.some(([lon, lat]) => Math.abs(lon) > 180 || Math.abs(lat) > 90);
	const open = ring[0].join() !== ring[ring.length - 1].join();
	// specks of less than a thousandth of a square degree may be turned by rounding
	const wrong = Math.abs(twice) > 1e-3 && twice > 0 !== outer;
	const faults = Object.entries({ far, away, open, wrong, short: ring.length < 4 });
	return faults.filter(([, is]) => is).map(([fault]) => `${name}: ${fault}`);
}

describe('GeoJSON', () => {
	const coverage = worldCoverage();
	const bytes = exportGeoJson(coverage, rowsOf(coverage));
	const { features }: Areas = JSON.parse(text(bytes));
	// the supplier's Antarctica has a strip of no width along the pole, which winds either way
	const usual = features.filter(({ properties }) => properties.name !== 'Antarctica');

	it('names the ink of every region by number, name and hex digits', () => {
		expect(features.map(({ id }) => id)).toEqual(coverage.keys);
		for (const { properties } of features) {
			const ink = inks[(properties.inkNumber as number) - 1];
			expect([properties.inkName, properties.hex]).toEqual([ink.name, ink.hex]);
		}
		expect(exportGeoJson(coverage, rowsOf(coverage))).toEqual(bytes);
	});

	it('closes rings, stays within 180 degrees and runs outer rings anticlockwise (RFC 7946)', () => {
		const faults: string[] = [];
		for (const { geometry, properties } of usual) {
			for (const rings of polygons(geometry)) {
				rings.forEach((ring, i) => faults.push(...ringFaults(ring, i === 0, properties.name)));
			}
		}
		expect(faults).toEqual([]);
	});

	it('keeps areas, by d3-geo', () => {
		const total = usual.reduce((sum, { geometry }) => {
			// d3-geo winds the other way round
			const turned = polygons(geometry).map((rings) => rings.map((ring) => ring.toReversed()));
			return sum + geoArea({ type: 'MultiPolygon', coordinates: turned });
		}, 0);
		const areas = coverage.areasKm2.filter((_, i) => coverage.names[i] !== 'Antarctica');
		const expected = areas.reduce((sum, one) => sum + one, 0) / 6371.0088 ** 2;
		expect(total / expected).toBeGreaterThan(0.999);
		expect(total / expected).toBeLessThan(1.001);
	});
});

describe('SVG file', () => {
	it('carries its letters, is well-formed and repeatable', () => {
		const faces = Object.keys(faceStyles) as Face[];
		const fonts = Object.fromEntries(
			faces.map((face) => [face, new Uint8Array(readFileSync(`static/fonts/${face}.ttf`))]),
		) as FaceFiles;
		const drawing = drawSheet(sheetOf(statesCoverage()));
		const bytes = exportSvg(drawing, { fonts });
		const svg = text(bytes);
		expect(svg.startsWith('<?xml version="1.0" encoding="UTF-8"?>\n<svg ')).toBe(true);
		const parser = new SaxesParser();
		parser.on('error', (error) => {
			throw error;
		});
		parser.write(svg).close();
		expect(svg.match(/@font-face/g)?.length).toBe(new Set(drawing.texts.map((t) => t.face)).size);
		expect(svg).not.toMatch(/url\((?!data:font\/ttf;base64,)/);
		expect(bytes.length - exportSvg(drawing).length).toBeLessThan(100_000);
		expect(exportSvg(drawing, { fonts })).toEqual(bytes);
	});
});
