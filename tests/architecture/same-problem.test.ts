import { describe, expect, it } from 'vitest';
import { problemOf as serverProblem } from '../../src/lib/server/services/draft-problem';
import { blankDraft } from '../support/blank-draft';
import { problemOf } from '../../src/lib/state/problem-of-draft';
import { numberRegions } from '../../src/lib/state/rules-in-force';

describe('problemOf', () => {
	it('asks what the server asks, so that both get the same answer', () => {
		const keys = ['a', 'b', 'c', 'd'];
		const borders = {
			a: Uint32Array.of(0, 0, 1, 2),
			b: Uint32Array.of(1, 2, 2, 3),
			kind: Uint8Array.of(0, 1, 0, 4),
			metres: Float64Array.of(5, 0, 7, 900),
			at: new Float64Array(8),
		};
		const draft = blankDraft({
			locks: { b: { ink: 1, cost: 3 } },
			forbidden: [{ key: 'a', ink: 0 }],
			alike: [['a', 'd']],
			apart: [['b', 'd']],
			pointTouches: true,
			leastMetres: 6,
			waterKm: 1,
			struck: [{ a: 'b', b: 'c', reason: 'a lake' }],
			added: [{ a: 'a', b: 'd', reason: 'a ferry' }],
			seed: 7,
		});
		const numbers = numberRegions(keys);
		for (const previous of [null, Int32Array.of(0, 1, 0, 1)])
			expect(problemOf(draft, keys, borders, numbers, previous)).toEqual(
				serverProblem({ keys, borders }, draft, previous),
			);
	});
});
