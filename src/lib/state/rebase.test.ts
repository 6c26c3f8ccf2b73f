import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../tests/support/blank-draft';
import { rebase } from './rebase';

const lock = (ink: number) => ({ ink, cost: 1 });

describe('rebase', () => {
	const base = blankDraft({ locks: { a: lock(0), b: lock(1) }, alike: [['a', 'c']] });

	it('keeps what only one side changed', () => {
		const mine = { ...base, locks: { a: lock(1), b: lock(1) } };
		const theirs = { ...base, inks: 5, locks: { a: lock(0), b: lock(1), d: lock(2) } };
		const { draft, both } = rebase(base, mine, theirs);
		expect(draft.locks).toEqual({ a: lock(1), b: lock(1), d: lock(2) });
		expect(draft.inks).toBe(5);
		expect(both).toEqual([]);
	});

	it('lets mine stand where both changed, and says where', () => {
		const mine = { ...base, locks: { ...base.locks, a: lock(1) } };
		const theirs = { ...base, locks: { ...base.locks, a: lock(3) } };
		const { draft, both } = rebase(base, mine, theirs);
		expect(draft.locks.a.ink).toBe(1);
		expect(both).toEqual(['lock on a']);
	});

	it('carries a release over, and theirs as well', () => {
		const mine = { ...base, locks: { b: lock(1) } };
		const theirs = { ...base, locks: { a: lock(0) } };
		expect(rebase(base, mine, theirs).draft.locks).toEqual({});
	});

	it('merges lists of rules by member', () => {
		const mine = { ...base, alike: [] };
		const theirs = {
			...base,
			alike: [
				['a', 'c'],
				['d', 'e'],
			] as [string, string][],
		};
		expect(rebase(base, mine, theirs).draft.alike).toEqual([['d', 'e']]);
	});

	it('does not call the same change a clash', () => {
		const changed = { ...base, layout: { ...base.layout, title: 'New' } };
		expect(rebase(base, changed, changed)).toEqual({ draft: changed, both: [] });
	});
});
