import { describe, expect, it } from 'vitest';
import type { Draft } from '../../src/lib/engines/editions/draft';
import { problemOf as serverProblem } from '../../src/lib/server/services/draft-problem';
import { blankDraft } from '../support/blank-draft';
import { colouringParts, problemOf } from '../../src/lib/state/problem-of-draft';
import { numberRegions } from '../../src/lib/state/rules-in-force';

/** The parts of a draft that decide nothing about which colourings keep its rules. */
const passedOver = ['goals', 'layout', 'palette', 'theme', 'ties'];

const keys = ['a', 'b', 'c', 'd', 'e'];
const borders = {
	a: Uint32Array.of(0, 0, 1, 2),
	b: Uint32Array.of(1, 2, 2, 3),
	kind: Uint8Array.of(0, 1, 0, 4),
	metres: Float64Array.of(5, 0, 7, 900),
	at: new Float64Array(8),
};
const draft = blankDraft({
	inks: 5,
	locks: { b: { ink: 1, cost: 3 } },
	forbidden: [{ key: 'a', ink: 0 }],
	alike: [['a', 'd']],
	apart: [['b', 'd']],
	groups: [
		{ kind: 'alike', name: 'North', keys: ['d', 'a', 'e', 'd'] },
		{ kind: 'different', name: 'South', keys: ['b', 'c', 'e'] },
	],
	reserved: [3, 1],
	pointTouches: true,
	leastMetres: 6,
	waterKm: 1,
	struck: [{ a: 'b', b: 'c', reason: 'a lake' }],
	added: [{ a: 'a', b: 'd', reason: 'a ferry' }],
	seed: 7,
});

describe('problemOf', () => {
	it('asks what the server asks, so that both get the same answer', () => {
		const numbers = numberRegions(keys);
		for (const previous of [null, Int32Array.of(0, 1, 0, 1, -1)])
			expect(problemOf(draft, keys, borders, numbers, previous)).toEqual(
				serverProblem({ keys, borders }, draft, previous),
			);
	});

	it('asks about every part of the draft that decides about the colouring', () => {
		const asked = JSON.stringify(serverProblem({ keys, borders }, draft));
		for (const [name, unsaid] of Object.entries(blankDraft())) {
			const without = { ...draft, [name]: unsaid };
			const same = JSON.stringify(serverProblem({ keys, borders }, without)) === asked;
			expect([name, same]).toEqual([name, passedOver.includes(name)]);
		}
	});

	it('is asked again whenever such a part changes', () => {
		const names = Object.keys(blankDraft());
		const named = Object.fromEntries(names.map((name) => [name, name])) as unknown as Draft;
		const parts = colouringParts(named);
		expect(names.filter((name) => !parts.includes(name)).sort()).toEqual(passedOver);
	});
});
