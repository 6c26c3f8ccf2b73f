import { describe, expect, it } from 'vitest';
import { ruleList } from '$lib/engines/editions/rule-list';
import { blankDraft } from '../../../tests/support/blank-draft';
import { ruleChanges } from './rule-changes';
import {
	dropRules,
	forbid,
	freshGroupName,
	groupFault,
	keepPair,
	lockAsShown,
	putGroups,
	reserve,
	weighAll,
} from './rule-edits';
import { regionsOfRule, ruleWords } from './rule-words';

const names = {
	region: (key: string) => key.toUpperCase(),
	ink: (ink: number) => ['Ochre', 'Blue'][ink],
	sheet: (number: number) => `sheet ${number}`,
};
const group = (kind: 'alike' | 'different', name: string, ...keys: string[]) => ({
	kind,
	name,
	keys,
});

describe('what people do to rules', () => {
	it('forbids an ink once, and allows it again without touching what an adjoining sheet asks', () => {
		const tied = { key: 'a', ink: 1, tie: 4 };
		const draft = blankDraft({ forbidden: [tied] });
		const once = forbid(['a', 'b'], 1, true)(forbid(['a'], 1, true)(draft));
		expect(once.forbidden).toEqual([tied, { key: 'a', ink: 1 }, { key: 'b', ink: 1 }]);
		expect(forbid(['a', 'b'], 1, false)(once).forbidden).toEqual([tied]);
	});

	it('keeps a pair alike or apart, never both', () => {
		const draft = keepPair('apart', 'b', 'a')(keepPair('alike', 'a', 'b')(blankDraft()));
		expect(draft).toMatchObject({ alike: [], apart: [['b', 'a']] });
	});

	it('puts groups in by name and finds a free one', () => {
		const draft = putGroups([
			group('alike', 'Group 1', 'a', 'b'),
			group('different', 'x', 'a', 'b'),
		])(putGroups([group('alike', 'Group 1', 'c', 'd')])(blankDraft()));
		expect(draft.groups.map(({ keys }) => keys)).toEqual([
			['a', 'b'],
			['a', 'b'],
		]);
		expect(freshGroupName(draft)).toBe('Group 2');
		expect(groupFault('different', 65)).toContain('64');
		expect([groupFault('alike', 65), groupFault('different', 64)]).toEqual(['', '']);
	});

	it('locks regions to the inks they have, keeping weights and who locked what stays', () => {
		const stays = { ink: 1, cost: 5, by: 'Ann', at: '2026-01-01' };
		const draft = blankDraft({ locks: { a: stays, b: { ...stays, ink: 0 } } });
		const { locks } = lockAsShown(
			[
				['a', 1],
				['b', 1],
				['c', 0],
				['d', -1],
			],
			'Eve',
		)(draft);
		expect(locks).toMatchObject({
			a: stays,
			b: { ink: 1, cost: 5, by: 'Eve' },
			c: { ink: 0, cost: 1 },
		});
		expect(locks).not.toHaveProperty('d');
		expect(weighAll(['a', 'z'], 3)(draft).locks).toMatchObject({ a: { cost: 3 }, b: { cost: 5 } });
	});

	it('removes what is listed, each rule in words', () => {
		const draft = reserve(
			1,
			true,
		)(
			putGroups([group('different', 'Coast', 'a', 'b', 'c')])(
				keepPair(
					'alike',
					'a',
					'b',
				)(forbid(['c'], 0, true)(blankDraft({ locks: { a: { ink: 0, cost: 2 } } }))),
			),
		);
		const rules = ruleList(draft);
		expect(rules.map((rule) => ruleWords(rule, names))).toEqual([
			'A is locked to Ochre, weight 2',
			'C may not have Ochre',
			'A and B are kept alike',
			'all 3 regions of Coast differ from each other',
			'Blue is reserved for regions locked to it',
		]);
		expect(rules.map((rule) => regionsOfRule(rule, names))).toEqual([
			...['A', 'C', 'A and B', 'A, B and C', 'every region'],
		]);
		expect(dropRules(rules)(draft)).toEqual(blankDraft());
	});

	it('tells what becomes of rules when a draft takes the place of another', () => {
		const before = blankDraft({
			locks: { a: { ink: 0, cost: 1, by: 'Ann' }, b: { ink: 0, cost: 1 } },
			groups: [group('alike', 'Coast', 'a', 'b')],
			reserved: [1],
		});
		const after = blankDraft({
			locks: { a: { ink: 0, cost: 1 }, b: { ink: 1, cost: 1 } },
			groups: [group('alike', 'Coast', 'b', 'a')],
			apart: [['a', 'b']],
		});
		const { added, changed, removed } = ruleChanges(before, after);
		const kinds = [added, changed, removed].map((list) => list.map(({ kind }) => kind));
		expect(kinds).toEqual([['keep apart'], ['lock'], ['reserved ink']]);
	});
});
