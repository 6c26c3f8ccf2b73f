import { expect, it } from 'vitest';
import { kindCode, type BorderList } from './border-list.ts';
import { knownGaps } from './known-gaps.ts';

const kinds = ['line', 'gap', 'water', 'gap', 'gap'] as const;
const borders: BorderList = {
	a: Uint32Array.from([0, 0, 1, 1, 2]),
	b: Uint32Array.from([1, 2, 2, 3, 3]),
	kind: Uint8Array.from(kinds, kindCode),
	metres: Float64Array.from([10, 2_000, 9_000, 2_001, 500]),
	at: Float64Array.from([0, 1, 2, 3, 4, 5, 6, 7, 8, 9]),
};

it('leaves out the gaps that the rule does not reach, and nothing else', () => {
	const within = knownGaps(borders, 2);
	expect([...within.a].map((a, i) => [a, within.b[i]])).toEqual([
		[0, 1],
		[0, 2],
		[1, 2],
		[2, 3],
	]);
	expect([...within.at]).toEqual([0, 1, 2, 3, 4, 5, 8, 9]);
	expect([...knownGaps(borders, null).metres]).toEqual([10, 9_000]);
	expect(knownGaps(borders, 3)).toBe(borders);
});
