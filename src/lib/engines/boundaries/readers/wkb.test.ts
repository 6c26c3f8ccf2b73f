import fc from 'fast-check';
import type { Geometry, Polygon } from 'geojson';
import { describe, expect, it } from 'vitest';
import { wkbBytes } from '../../../../../tests/support/wkb.ts';
import { defaultLimits } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { wkbOf } from './gpkg-geometry.ts';
import { Wkb } from './wkb.ts';

function read(bytes: number[]) {
	const layer = new RawLayer(defaultLimits);
	layer.startRegion();
	new Wkb(Uint8Array.from(bytes), layer, 'Feature 1').read();
	return layer;
}
const positions = (layer: RawLayer) => [...layer.points.taken()];
const fromHex = (hex: string) => (hex.match(/../g) ?? []).map((byte) => parseInt(byte, 16));

function refused(bytes: number[]): Refusal {
	try {
		read(bytes);
	} catch (error) {
		if (error instanceof Refusal) return error;
		throw error;
	}
	throw new Error('not refused');
}

const square: Polygon = {
	type: 'Polygon',
	coordinates: [
		[
			[0, 0],
			[1, 0],
			[1, 1],
			[0, 0],
		],
	],
};

describe('well-known binary', () => {
	it('is read as published examples have it', () => {
		// from memory of the usual example of OGC 06-103r4: POINT(2 4), big-endian
		const point = read(fromHex('000000000140000000000000004010000000000000'));
		expect([point.strayPoints, point.points.length]).toEqual([1, 0]);
		// from memory of the manual of a spatial database: POLYGON((0 0,0 1,1 1,1 0,0 0)), little-endian
		const corner = (x: number, y: number) =>
			[x, y].map((v) => (v ? '000000000000f03f' : '0000000000000000')).join('');
		const ring = corner(0, 0) + corner(0, 1) + corner(1, 1) + corner(1, 0) + corner(0, 0);
		const polygon = read(fromHex(`01030000000100000005000000${ring}`));
		expect(positions(polygon)).toEqual([0, 0, 0, 1, 1, 1, 1, 0, 0, 0]);
	});

	it('passes over heights and measures in either byte order', () => {
		for (const little of [true, false]) {
			for (const z of [true, false]) {
				for (const m of [true, false]) {
					const layer = read(wkbBytes(square, { little, z, m }));
					expect(positions(layer)).toEqual(square.coordinates[0].flat());
				}
			}
		}
	});

	it('takes the areas of a collection and counts the rest', () => {
		const geometries: Geometry[] = [
			square,
			{ type: 'MultiPoint', coordinates: [[0, 0]] },
			{ type: 'MultiPolygon', coordinates: [square.coordinates, square.coordinates] },
			{ type: 'LineString', coordinates: square.coordinates[0] },
		];
		const layer = read(wkbBytes({ type: 'GeometryCollection', geometries }));
		expect(layer.partRings.length).toBe(3);
		expect([layer.strayPoints, layer.strayLines]).toEqual([1, 1]);
	});

	it('refuses curves and surfaces in space by name', () => {
		const code = (kind: number) => [1, kind, 0, 0, 0, 0, 0, 0, 0];
		const named = { 8: 'CircularString', 10: 'CurvePolygon', 15: 'PolyhedralSurface', 16: 'TIN' };
		for (const [kind, name] of Object.entries(named)) {
			const refusal = refused(code(Number(kind)));
			expect(refusal.code).toBe('unsupported-format');
			expect(refusal.message).toContain(`Feature 1 is a ${name}`);
		}
	});

	it('refuses counts that its bytes cannot hold, before it takes memory for them', () => {
		const rings = [1, 3, 0, 0, 0, 255, 255, 255, 255];
		expect(refused(rings).message).toContain('4294967295 rings but only 0 bytes follow');
		const points = [1, 3, 0, 0, 0, 1, 0, 0, 0, 255, 255, 255, 127];
		expect(refused(points).message).toContain('2147483647 points');
		const members = [1, 6, 0, 0, 0, 255, 255, 255, 255];
		expect(refused(members).message).toContain('geometries');
	});

	it('refuses what is no number, no kind, no byte order, and what follows the end', () => {
		const bytes = wkbBytes(square);
		const spoilt = (at: number, ...values: number[]) => {
			const copy = [...bytes];
			copy.splice(at, values.length, ...values);
			return refused(copy);
		};
		expect(spoilt(13, 0, 0, 0, 0, 0, 0, 0xf8, 0x7f).code).toBe('bad-coordinate');
		expect(spoilt(13, 0, 0, 0, 0, 0, 0, 0xf0, 0xff).message).toContain('-Infinity');
		expect(spoilt(1, 99).message).toContain('99 is no kind of geometry');
		expect(spoilt(0, 7).message).toContain('byte order is 7');
		expect(refused([...bytes, 0]).message).toContain('1 bytes follow');
	});

	it('refuses collections within collections without end', () => {
		let bytes = wkbBytes(square);
		for (let level = 0; level < 20; level++) bytes = [1, 7, 0, 0, 0, 1, 0, 0, 0, ...bytes];
		expect(refused(bytes).message).toContain('nest deeper than 8 levels');
	});

	it('is refused or read, whatever the bytes', () =>
		fc.assert(
			fc.property(fc.nat(200), fc.nat(255), fc.nat(200), (at, value, cut) => {
				const bytes = wkbBytes({ type: 'MultiPolygon', coordinates: [square.coordinates] });
				bytes[at % bytes.length] = value;
				try {
					read(bytes.slice(0, cut));
				} catch (error) {
					if (!(error instanceof Refusal)) throw error;
				}
			}),
			{ numRuns: 500 },
		));
});

// OGC 12-128r19, clause 2.1.3, table 6: flags and envelope indicators, from memory
it('finds the binary behind the header of a GeoPackage geometry', () => {
	const header = (flags: number, length: number) =>
		Uint8Array.from([0x47, 0x50, 0, flags, 0, 0, 0, 0, ...new Array(length).fill(9)]);
	expect(wkbOf(header(1, 3), 'F')).toHaveLength(3);
	[0, 32, 48, 48, 64].forEach((envelope, indicator) => {
		expect(wkbOf(header(indicator << 1, envelope + 5), 'F')).toHaveLength(5);
	});
	expect(wkbOf(header(0x10, 0), 'F')).toBeNull();
	for (const flags of [5 << 1, 6 << 1, 7 << 1, 0x20]) {
		expect(() => wkbOf(header(flags, 99), 'F')).toThrow(Refusal);
	}
	expect(() => wkbOf(header(2, 10), 'F')).toThrow(/ends in its header/);
	expect(() => wkbOf(Uint8Array.of(0x47, 0x51, 0, 0, 0, 0, 0, 0), 'F')).toThrow(/"GP"/);
});
