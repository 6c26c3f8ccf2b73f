import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { ruleCounts, ruleKinds, ruleList, rulesAbout } from './rule-list.ts';

const draft = blankDraft({
	locks: { a: { ink: 0, cost: 2, by: 'Ann', at: '2026-01-01' }, b: { ink: 1, cost: 1, tie: 4 } },
	forbidden: [
		{ key: 'a', ink: 1 },
		{ key: 'a', ink: 1, tie: 4 },
	],
	alike: [['a', 'c']],
	apart: [['b', 'c']],
	groups: [
		{ kind: 'alike', name: 'Coast', keys: ['b', 'c'] },
		{ kind: 'different', name: 'Coast', keys: ['a', 'd'] },
	],
	reserved: [1],
});

describe('the list of rules', () => {
	it('holds every rule once, each under a name of its own', () => {
		const rules = ruleList(draft);
		expect(rules.map(({ kind }) => kind)).toEqual([
			...['lock', 'lock', 'forbidden ink', 'forbidden ink', 'keep alike', 'keep apart'],
			...['all alike', 'all different', 'reserved ink'],
		]);
		expect(new Set(rules.map(({ id }) => id)).size).toBe(rules.length);
		const doubled = { ...draft, alike: [...draft.alike, ['c', 'a'] as [string, string]] };
		expect(ruleList(doubled)).toHaveLength(rules.length);
	});

	it('is emptied by dropping one after the other, whichever comes first', () => {
		for (const rules of [ruleList(draft), ruleList(draft).reverse()]) {
			const left = rules.reduce((now, { drop }) => drop(now), draft);
			expect(left).toEqual(blankDraft());
		}
	});

	it('of one region is what the whole list says of it', () => {
		for (const key of ['a', 'b', 'c', 'd', 'e', 'constructor']) {
			const among = ruleList(draft).filter(({ keys }) => keys.includes(key));
			expect(rulesAbout(draft, key).map(({ id }) => id)).toEqual(among.map(({ id }) => id));
		}
	});

	it('counts as many as it lists', () => {
		const counts = ruleCounts(draft);
		for (const kind of ruleKinds) {
			expect(counts[kind]).toBe(ruleList(draft).filter((rule) => rule.kind === kind).length);
		}
	});
});
