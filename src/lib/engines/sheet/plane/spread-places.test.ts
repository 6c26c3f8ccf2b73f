import { describe, expect, it } from 'vitest';
import { spreadPlaces } from './spread-places.ts';

describe('places spread over a map', () => {
	it('hold the four furthest out, wherever they stand in the list', () => {
		const points = Int32Array.from({ length: 2000 }, (_, i) => (i * 37) % 101);
		points.set([-500, 50], 2 * 333);
		points.set([900, 51], 2 * 777);
		points.set([50, -400], 2 * 512);
		points.set([51, 800], 2 * 998);
		const all = Uint32Array.from({ length: 1000 }, (_, i) => i);
		const taken = spreadPlaces(points, all, 10);
		expect(taken).toEqual(expect.arrayContaining([333, 777, 512, 998]));
		expect(taken.length).toBe(14);
		expect(spreadPlaces(points, all.subarray(0, 300), 10)).not.toContain(333);
		expect(spreadPlaces(points, [], 10)).toEqual([]);
	});
});
