import { describe, expect, it } from 'vitest';
import { linkRegions, neighboursOf } from './region-links';

describe('neighboursOf', () => {
	const list = {
		a: Uint32Array.of(0, 0, 1),
		b: Uint32Array.of(1, 2, 2),
		kind: Uint8Array.of(0, 1, 0),
		metres: Float64Array.of(500, 0, 900),
		at: new Float64Array(6),
	};
	const links = linkRegions(4, list);

	it('lists every border under both its regions, longest first', () => {
		expect(neighboursOf(0, list, links).map(({ region }) => region)).toEqual([1, 2]);
		expect(neighboursOf(2, list, links).map(({ region }) => region)).toEqual([1, 0]);
	});

	it('knows regions that touch nothing', () => {
		expect(neighboursOf(3, list, links)).toEqual([]);
	});
});
