import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import type { Draft } from './draft.ts';
import { addRules, replaceRules, rulesFromCsv, rulesToCsv } from './rules-csv.ts';

const ground = { keys: ['01', '02', '03', '04'], names: ['Nord', '', '', ''], inks: ['Ochre'] };
const head = 'rule,region,other region,ink,weight,group';
function read(text: string) {
	const found = rulesFromCsv(text, ground);
	if (found.status === 'refused') throw new Error(found.message);
	return found;
}

describe('rules from a table in a draft', () => {
	const draft: Draft = blankDraft({
		locks: {
			'01': { ink: 0, cost: 1, by: 'Ann', at: '2026-01-01' },
			'02': { ink: 1, cost: 1, tie: 7 },
			'04': { ink: 1, cost: 1 },
		},
		forbidden: [{ key: '03', ink: 0, tie: 7 }],
		alike: [['01', '04']],
		groups: [{ kind: 'alike', name: 'Coast', keys: ['01', '03'] }],
		reserved: [1],
	});
	const { parts } = read(
		[
			head,
			'lock,01,,1,,',
			'lock,02,,1,,',
			'keep alike,04,01,,,',
			'all alike,04,,,,Coast',
			'all alike,01,,,,Coast',
		].join('\n'),
	);

	it('replace its own rules, and nothing that an adjoining sheet asks for', () => {
		expect(replaceRules(draft, parts)).toMatchObject({
			locks: {
				'01': { ink: 0, cost: 1, by: 'Ann', at: '2026-01-01' },
				'02': { ink: 1, cost: 1, tie: 7 },
			},
			forbidden: [{ key: '03', ink: 0, tie: 7 }],
			groups: [{ kind: 'alike', name: 'Coast', keys: ['04', '01'] }],
			reserved: [],
		});
		expect(Object.keys(replaceRules(draft, parts).locks)).toEqual(['01', '02']);
	});

	it('are added to them, none twice', () => {
		const added = addRules(draft, parts);
		expect(added).toEqual({
			...draft,
			groups: [{ kind: 'alike', name: 'Coast', keys: ['01', '03', '04'] }],
		});
	});

	it('change nothing when they are its own', () => {
		const own = read(rulesToCsv(draft));
		expect(addRules(draft, own.parts)).toEqual(draft);
		expect(replaceRules(draft, own.parts)).toEqual(draft);
	});
});
