import { booleanPointInPolygon, polygon } from '@turf/turf';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { describe, expect, it } from 'vitest';
import { bytesOf, conterminousStates } from '../../../../tests/support/atlas.ts';
import { multi, square } from '../../../../tests/support/dirty-maps.ts';
import {
	accepted,
	acceptedFeatures,
	box,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import { piecesOf } from './index.ts';

/** "key kind in key", largest part of each region first; each place is held to its own part by turf. */
async function pieces(map: Feature<Polygon | MultiPolygon>[]) {
	const { coverage } = await acceptedFeatures(map);
	const { keys } = coverage;
	return piecesOf(coverage).map(({ region: r, kind, within, at }) => {
		const drawn = map.find(({ id }) => id === keys[r]) as Feature<Polygon | MultiPolygon>;
		expect(booleanPointInPolygon(at, drawn)).toBe(true);
		return `${keys[r]} ${kind}${within < 0 ? '' : ` in ${keys[within]}`}`;
	});
}

const around = (...holes: number[][][]) => region('around', square(0, 0, 10, 10), ...holes);

describe('pieces of regions', () => {
	it('are none where every region lies in one piece among its neighbours', async () => {
		expect(await pieces([box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)])).toEqual([]);
	});
	it('an enclave that fills its hole is a main part within another', async () => {
		const hole = square(2, 2, 4, 4);
		expect(await pieces([around(hole), region('in', hole)])).toEqual(['in main in around']);
	});
	it('an exclave within another region, and one on the outside', async () => {
		const hole = square(2, 2, 4, 4);
		const home = multi('home', [square(10, 0, 20, 10)], [hole], [square(-1, 0, 0, 1)]);
		expect(await pieces([around(hole), home])).toEqual([
			'home main',
			'home exclave in around',
			'home exclave',
		]);
	});
	it('an enclave that has an exclave of its surroundings in it', async () => {
		const [hole, inner] = [square(2, 2, 6, 6), square(3, 3, 4, 4)];
		const surroundings = multi('around', [square(0, 0, 10, 10), hole], [inner]);
		expect(await pieces([surroundings, region('ring', hole, inner)])).toEqual([
			'around main',
			'around exclave in ring',
			'ring main in around',
		]);
	});
	it('an island in a lake within an enclave', async () => {
		const [hole, lake, island] = [square(2, 2, 8, 8), square(3, 3, 7, 7), square(4, 4, 5, 5)];
		const alone = region('island', island);
		expect(await pieces([around(hole), region('ring', hole, lake), alone])).toEqual([
			'ring main in around',
			'island island in ring',
		]);
		const own = multi('ring', [hole, lake], [island]);
		expect(await pieces([around(hole), own])).toEqual([
			'ring main in around',
			'ring island in around',
		]);
	});
	it('parts that touch in a point only are no islands; regions alone in the sea are', async () => {
		const map = [
			multi('a', [square(0, 0, 2, 2)], [square(3, 3, 4, 4)]),
			box('b', 2, 0, 3, 3),
			box('far', 20, 20, 21, 21),
		];
		expect(await pieces(map)).toEqual(['a main', 'a exclave', 'far island']);
	});
	it('have the areas of their parts', async () => {
		const two = multi('a', [square(0, 0, 1, 1)], [square(3, 0, 5, 1)]);
		const { coverage } = await acceptedFeatures([two]);
		const rows = piecesOf(coverage);
		expect(rows.map(({ kind }) => kind)).toEqual(['main', 'island']);
		expect(rows[0].areaKm2 / rows[1].areaKm2).toBeCloseTo(2, 9);
		expect(rows[0].areaKm2 + rows[1].areaKm2).toBeCloseTo(coverage.areasKm2[0], 6);
		expect(coverage.partRings.length).toBe(3);
	});
});

describe('the 48 states and the District of Columbia (us-atlas, U.S. Census Bureau)', () => {
	it('Michigan, Kentucky and Virginia have the parts that are known of them', async () => {
		const { coverage } = await accepted(bytesOf(conterminousStates()));
		const of = (key: string) =>
			piecesOf(coverage).filter(({ region: r }) => coverage.keys[r] === key);
		// Of Michigan's two peninsulas the lower is the larger; the upper has its only land border with
		// Wisconsin (U.S. Census Bureau, state boundaries).
		const [lower, upper, ...islands] = of('26');
		expect(lower).toMatchObject({ kind: 'main', within: -1 });
		expect(lower.at[1]).toBeLessThan(45.9);
		expect(upper.kind).toBe('exclave');
		expect(upper.at[1]).toBeGreaterThan(45.5);
		expect(islands.every(({ kind }) => kind === 'island')).toBe(true);
		// The Kentucky Bend, some 70 km² cut off by the Mississippi (Kentucky, Fulton County).
		const bend = of('21').filter(({ kind }) => kind === 'exclave');
		expect(bend).toHaveLength(1);
		expect(bend[0].areaKm2).toBeGreaterThan(40);
		expect(bend[0].areaKm2).toBeLessThan(100);
		expect(bend[0].at[0]).toBeCloseTo(-89.5, 0);
		// The Eastern Shore beyond the Chesapeake Bay, and the south end of Smith Island, which the line
		// with Maryland crosses.
		const virginian = of('51').filter(({ kind }) => kind === 'exclave');
		expect(virginian.map(({ at }) => at.map(Math.round))).toEqual([
			[-76, 38],
			[-76, 38],
		]);
		expect(virginian[0].areaKm2).toBeGreaterThan(1000);
		expect(virginian[1].areaKm2).toBeLessThan(20);
	});
});

it('a place inside is inside also where a part is thin or has holes', async () => {
	const ring = region('c', square(0, 0, 10, 10), square(0.1, 0.1, 9.9, 9.9));
	const { coverage } = await acceptedFeatures([ring, box('in', 0.1, 0.1, 9.9, 9.9)]);
	const [inner] = piecesOf(coverage);
	expect(booleanPointInPolygon(inner.at, polygon([[...square(0, 0, 10, 10), [0, 0]]]))).toBe(true);
});
