import { strToU8 } from 'fflate';
import { describe, expect, it } from 'vitest';
import {
	accepted,
	box,
	collection,
	refusal,
} from '../../../../../tests/support/read-boundaries.ts';
import { readBoundaries, sourceOf } from '../index.ts';

const two = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)];
const [a, b] = two.map((feature) => JSON.stringify(feature));
const keysOf = async (text: string) => (await accepted(strToU8(text))).coverage.keys;

describe('sequences of features', () => {
	it.each([
		['a record separator before each (RFC 8142, 2.1)', `\x1e${a}\n\x1e${b}\n`],
		['several record separators and no line feeds', `\x1e\x1e${a}\x1e${b}`],
		['a feature a line', `${a}\n${b}`],
		['carriage returns, blank lines and a mark', `\ufeff\r\n${a}\r\n\r\n  \r\n${b}\r\n\r\n`],
		[
			'collections a line',
			[a, b].map((f) => `{"type":"FeatureCollection","features":[${f}]}`).join('\n'),
		],
	])('%s', async (_, text) => {
		expect(await keysOf(text)).toEqual(['a', 'b']);
		for (const size of [1, 2, 3, 50]) {
			const pieces = await readBoundaries(sourceOf('t', strToU8(text), size));
			expect(pieces.status).toBe('accepted');
		}
	});

	// RFC 8142, 2.4: a text that is cut off must not be taken for a whole one
	it.each([
		['a last line cut off', `${a}\n${b.slice(0, -2)}`, 'file-truncated'],
		[
			'a last line cut off within a number',
			`${a}\n${b.slice(0, b.indexOf('2,1'))}`,
			'file-truncated',
		],
		['a record cut off by the next', `\x1e${a.slice(0, -5)}\x1e${b}`, 'not-json'],
	])('%s is refused', async (_, text, code) => {
		expect((await refusal(strToU8(text))).code).toBe(code);
	});
});

describe('geometries', () => {
	const feature = (geometry: object | null) => ({
		type: 'Feature',
		id: 'm',
		properties: {},
		geometry,
	});
	const point = { type: 'Point', coordinates: [0, 0] };
	const lines = { type: 'MultiLineString', coordinates: [[[0, 0], [1, 1]]] }; // prettier-ignore

	it('points, lines and nothing among areas are left out and told', async () => {
		const features = [...two, feature(point), feature(lines), feature(null)];
		const text = JSON.stringify({ type: 'FeatureCollection', features });
		for (const size of [7, 1 << 20]) {
			const read = await readBoundaries(sourceOf('t', strToU8(text), size));
			if (read.status !== 'accepted') throw new Error(read.status);
			expect(read.coverage.keys).toEqual(['a', 'b']);
			const told = read.findings.filter(({ code }) => /mixed|no-area/.test(code));
			expect(told.map(({ message }) => message)).toEqual([
				'The file holds areas, and 1 point and 1 line that were left out.',
				expect.stringContaining('number 3 (m), 4 (m), 5 (m)'),
			]);
		}
	});

	it('collections give their areas as parts of one region, their points are told', async () => {
		const geometries = [
			two[0].geometry,
			point,
			{ type: 'GeometryCollection', geometries: [two[1].geometry] },
		];
		const text = JSON.stringify(feature({ type: 'GeometryCollection', geometries }));
		const { coverage, findings } = await accepted(strToU8(text));
		expect(coverage.keys).toEqual(['m']);
		expect(findings.map(({ code }) => code)).toContain('mixed-geometry');
	});

	it('points alone are refused', async () => {
		const { code, message } = await refusal(strToU8(JSON.stringify(feature(point))));
		expect([code, message]).toEqual(['no-areas', 'The file holds no areas, only 1 point.']);
	});
});

it('the crs member of 2008 may be a name, a code or CRS84', async () => {
	for (const [crs, name] of [
		[{ type: 'name', properties: { name: 'EPSG:3857' } }, 'EPSG:3857'],
		[{ type: 'EPSG', properties: { code: 3857 } }, 'EPSG:3857'],
		[{ type: 'name', properties: { name: 'urn:ogc:def:crs:OGC:1.3:CRS84' } }, 'EPSG:4326'],
	] as const) {
		const { source } = await accepted(strToU8(JSON.stringify({ crs, ...collection(two) })));
		expect(source.crs).toBe(name);
	}
});

it('long decimals and long whole numbers in properties are kept apart', async () => {
	const properties =
		'{"share":0.12345678901234567,"code":-12345678901234567890,"text":"1234567890123456789"}';
	const { attributes } = await accepted(
		strToU8(a.replace('"properties":{}', `"properties":${properties}`)),
	);
	expect(attributes.rows[0]).toEqual([
		Number('0.12345678901234567'),
		'-12345678901234567890',
		'1234567890123456789',
	]);
});
