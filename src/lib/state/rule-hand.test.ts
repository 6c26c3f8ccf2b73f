import { describe, expect, it } from 'vitest';
import type { Draft } from '$lib/engines/editions/draft';
import { blankDraft } from '../../../tests/support/blank-draft';
import type { Desk } from './desk.svelte';
import { RuleHand } from './rule-hand.svelte';

/** As much of a desk as the hand asks for. */
function fakeDesk() {
	const selected: (number | null)[] = [];
	const steps: string[] = [];
	const draft = {
		document: blankDraft(),
		change(label: string, make: (draft: Draft) => Draft) {
			steps.push(label);
			this.document = make(this.document);
		},
	};
	const key = ['a', 'b', 'c'];
	const desk = {
		...{ draft, view: 'table', nameOf: (region: number) => key[region].toUpperCase() },
		sheet: { regions: { key } },
		numbers: new Map(key.map((each, region) => [each, region])),
		select: (region: number | null) => selected.push(region),
	};
	return { desk: desk as unknown as Desk, draft, selected, steps };
}

describe('a pair begun for a rule', () => {
	it('is completed by the next region, in one step, and the first is selected again', () => {
		const { desk, draft, selected, steps } = fakeDesk();
		const hand = new RuleHand(desk);
		hand.begin('apart', 2);
		expect([desk.view, hand.pairing]).toEqual(['sheet', { kind: 'apart', from: 2 }]);
		hand.complete(2);
		expect([hand.spoken, hand.pairing !== null]).toEqual([
			'That is the region itself. Choose another.',
			true,
		]);
		hand.complete(0);
		expect(draft.document.apart).toEqual([['c', 'a']]);
		expect([hand.pairing, selected, steps]).toEqual([null, [2], ['keep C and A apart']]);
		expect(hand.spoken).toBe('C and A are kept apart.');
	});

	it('ends without a rule, and nothing happens when none was begun', () => {
		const { desk, draft, selected, steps } = fakeDesk();
		const hand = new RuleHand(desk);
		hand.complete(1);
		hand.end();
		expect(selected).toEqual([]);
		hand.begin('alike', 1);
		hand.end();
		expect([hand.pairing, selected, steps]).toEqual([null, [1], []]);
		expect(draft.document).toEqual(blankDraft());
	});
});

it('names regions, inks and adjoining sheets, those unknown by what is known of them', () => {
	const { names } = new RuleHand(fakeDesk().desk);
	expect([names.region('b'), names.region('gone')]).toEqual(['B', 'gone']);
	expect([names.ink(1), names.ink(7), names.sheet(3)]).toEqual(['Two', 'ink 8', 'sheet 3']);
});
