import { geoArea } from 'd3-geo';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layout, statesCoverage, worldCoverage } from '../../../../../tests/support/sheets.ts';
import { placeOnPaper } from '../place-on-paper.ts';
import { ringDoubleArea, ringPoints } from '../fills.ts';
import { chooseProjection } from './choose-projection.ts';
import { cutLine, cutRing } from './cut-open.ts';
import { extentOf, type Extent } from './extent.ts';
import { withoutSeams } from './seams.ts';
import {
	albers,
	cylindrical,
	equalEarth,
	lambertAzimuthal,
	transverseCylindrical,
} from './projections.ts';

const extent = (west: number, east: number, south: number, north: number): Extent => ({
	...{ west, east, south, north },
	cut: 180,
	crossed: false,
});
const sentence = (one: Extent) => chooseProjection(one, { projection: 'auto' }).sentence;

describe('extent', () => {
	it('of the 48 states is what their maker says', () => {
		const { west, east, south, north, crossed } = extentOf(statesCoverage());
		// us-atlas README, bbox of the conterminous states to a degree
		expect([west, east, south, north].map(Math.round)).toEqual([-125, -67, 25, 49]);
		expect(crossed).toBe(false);
	});

	it('runs across 180 degrees the short way', () => {
		const found = extentOf(worldCoverage(['Fiji', 'Tonga', 'Samoa']));
		expect(found.west).toBeGreaterThan(170);
		expect(found.east - found.west).toBeLessThan(15);
		expect(found.crossed).toBe(false);
	});

	it('of the world is the whole turn and reaches the south pole', () => {
		expect(extentOf(worldCoverage())).toMatchObject({ west: -180, east: 180, south: -90 });
	});
});

describe('choice of projection by Snyder 1987, pp. 33-35', () => {
	it.each([
		['the world', extent(-180, 180, -60, 80), 'Equal Earth'],
		['an east-west shape in middle latitudes', extent(-125, -67, 25, 49), 'Albers'],
		['an east-west shape on the equator', extent(95, 141, -11, 6), 'Cylindrical equal-area'],
		['about as wide as high', extent(-5, 9, 42, 51), 'Lambert azimuthal'],
		['a north-south shape', extent(-76, -67, -56, -17), 'Transverse cylindrical'],
		['a polar cap', extent(-180, 180, 62, 90), 'Lambert azimuthal equal-area, centre 90° N.'],
	])('%s', (_, one, beginning) => {
		expect(sentence(one).startsWith(beginning)).toBe(true);
	});

	it('puts parallels a sixth in from each limit', () => {
		expect(sentence(extent(0, 60, 30, 60))).toBe(
			'Albers equal-area conic, parallels 35° N and 55° N, centre 30° E.',
		);
	});

	it('follows the user', () => {
		const chosen = chooseProjection(extent(0, 60, 30, 60), { projection: 'equal-earth' });
		expect(chosen.sentence).toBe('Equal Earth, centre 30° E.');
	});
});

describe('every projection', () => {
	const all = [
		albers(30, 50, 20),
		albers(-40, -10, 20),
		lambertAzimuthal(45, 20),
		cylindrical(30, 20),
		transverseCylindrical(20),
		equalEarth(20),
	];

	it('keeps areas and can be undone', () => {
		const lon = fc.double({ min: -30, max: 70, noNaN: true });
		const lat = fc.double({ min: -70, max: 70, noNaN: true });
		fc.assert(
			fc.property(lon, lat, (x, y) => {
				const d = 0.01;
				const corners: [number, number][] = [
					[x, y],
					[x, y + d],
					[x + d, y + d],
					[x + d, y],
				];
				const ground = geoArea({ type: 'Polygon', coordinates: [[...corners, corners[0]]] });
				for (const { projection, sentence: words } of all) {
					const flat = corners.flatMap((corner) => projection(corner)!);
					const share = Math.abs(ringDoubleArea(flat)) / 2 / ground;
					expect(share, words).toBeGreaterThan(0.999);
					expect(share, words).toBeLessThan(1.001);
					const [lon2, lat2] = projection.invert!(projection([x, y])!)!;
					expect(lon2).toBeCloseTo(x, 6);
					expect(lat2).toBeCloseTo(y, 6);
				}
			}),
			{ numRuns: 60 },
		);
	});
});

describe('cutting at 180 degrees', () => {
	it('parts a ring that runs across', () => {
		const pieces = cutRing([
			[170, 0],
			[190, 0],
			[190, 10],
			[170, 10],
			[170, 0],
		]);
		const boxes = pieces.map((ring) => [
			Math.min(...ring.map(([lon]) => lon)),
			Math.max(...ring.map(([lon]) => lon)),
		]);
		expect(boxes).toEqual([
			[170, 180],
			[-180, -170],
		]);
		for (const piece of pieces) expect(piece[0]).toEqual(piece[piece.length - 1]);
	});

	it('closes a ring round the pole through the pole', () => {
		const [cap, ...more] = cutRing([
			[-180, -70],
			[-90, -75],
			[0, -70],
			[90, -75],
			[180, -70],
		]);
		expect(more).toEqual([]);
		expect(cap).toContainEqual([180, -90]);
		expect(cap).toContainEqual([-180, -90]);
	});

	it('parts a line and keeps its order', () => {
		expect(
			cutLine([
				[170, 0],
				[190, 10],
				[200, 10],
			]),
		).toEqual([
			[
				[170, 0],
				[180, 5],
			],
			[
				[-180, 5],
				[-170, 10],
				[-160, 10],
			],
		]);
	});

	it('leaves out seams of the file and nothing else', () => {
		expect(
			withoutSeams([
				[170, 5],
				[180, 5],
				[180, 10],
				[170, 10],
			]),
		).toEqual([
			[
				[170, 5],
				[180, 5],
			],
			[
				[180, 10],
				[170, 10],
			],
		]);
		expect(
			withoutSeams([
				[1, 5],
				[2, 5],
			]),
		).toBeNull();
	});

	it('keeps the areas of countries on a map of the world', () => {
		const coverage = worldCoverage();
		const box = { x: 0, y: 0, width: 40_000, height: 20_000 };
		const { arcs, rings } = placeOnPaper(coverage, layout, () => ({ map: box, scale: 1 }));
		const flat = rings.map((list) =>
			Math.abs(list.reduce((sum, ring) => sum + ringDoubleArea(ringPoints(arcs, ring)), 0)),
		);
		const total = (list: ArrayLike<number>) => Array.from(list).reduce((a, b) => a + b, 0);
		const scale = total(coverage.areasKm2) / total(flat);
		for (const name of ['Russia', 'Antarctica', 'Fiji', 'United States of America', 'Brazil']) {
			const region = coverage.names.indexOf(name);
			const share = (flat[region] * scale) / coverage.areasKm2[region];
			expect(Math.abs(share - 1), name).toBeLessThan(name === 'Fiji' ? 0.1 : 0.02);
		}
	});
});
