import { expect, it } from 'vitest';
import { Room } from '../geometry/room.ts';
import { indexSegments } from './segments.ts';

const corners = 61;

/** One ring along every edge between any two of the corners: for a prime number each step goes all round. */
const ring = Array.from({ length: (corners * (corners - 1)) / 2 }, (_, i) => {
	const step = 1 + Math.floor(i / corners);
	return (i * step) % corners;
});

// Euler: a complete graph of an odd number of corners can be walked along each edge once.
it('indexes far more segments than a map has for its corners, also in memory used before', () => {
	const outlines = {
		positions: new Float64Array(2 * corners),
		vertices: corners,
		ringVertices: Uint32Array.from(ring),
		ringStarts: Uint32Array.of(0, ring.length),
		ringRegion: Uint32Array.of(7),
		regions: 8,
	};
	const room = new Room();
	room.give(new Int32Array(200_000).fill(-9));
	for (let round = 0; round < 2; round++) {
		const { count, low, high, left, right, twins } = indexSegments(outlines, room);
		expect(count).toBe(ring.length);
		expect(twins).toEqual([]);
		const sides = new Map(ring.map((to, i) => [`${ring.at(i - 1)} ${to}`, 7]));
		for (let s = 0; s < count; s++) {
			expect(low[s]).toBeLessThan(high[s]);
			expect(left[s]).toBe(sides.get(`${low[s]} ${high[s]}`) ?? -1);
			expect(right[s]).toBe(sides.get(`${high[s]} ${low[s]}`) ?? -1);
		}
		for (const array of [low, high, left, right]) room.give(array);
	}
});
