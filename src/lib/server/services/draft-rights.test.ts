import { describe, expect, it } from 'vitest';
import { actions } from '../access/roles.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import { firstDraft } from './first-draft.ts';
import { changedParts, changesColouring, rightsFor, signDraft } from './draft-rights.ts';

const palette = { id: 'p', name: 'P', inks: [{ name: 'Ochre', hex: '#ebb855' }] };
const draft: Draft = firstDraft({ title: 'A sheet', palette, portrait: false });

describe('the rights a change of a draft needs', () => {
	it('names one for every part of it', () => {
		const parts = Object.keys(draft) as (keyof Draft)[];
		const altered = Object.fromEntries(parts.map((part) => [part, 'other'])) as unknown as Draft;
		expect(changedParts(draft, altered).sort()).toEqual(parts.sort());
		for (const right of rightsFor(parts)) expect(actions).toContain(right);
	});

	it('asks only for what changed', () => {
		const locked = { ...draft, locks: { a: { ink: 0, cost: 1 } } };
		expect(rightsFor(changedParts(draft, locked))).toEqual(['colours.edit']);
		const retitled = { ...draft, layout: { ...draft.layout, title: 'Another' } };
		expect(rightsFor(changedParts(draft, retitled))).toEqual(['layout.edit']);
		expect(changesColouring(changedParts(draft, retitled))).toBe(false);
		expect(changesColouring(changedParts(draft, locked))).toBe(true);
		expect(changedParts(draft, structuredClone(draft))).toEqual([]);
	});
});

describe('signing', () => {
	const before = { ...draft, locks: { a: { ink: 0, cost: 1, by: 'Ada', at: '2026-01-01' } } };

	it('never takes the word of the sender for who set a lock', () => {
		const sent = {
			...draft,
			locks: { a: { ink: 0, cost: 1, by: 'Mallory' }, b: { ink: 0, cost: 1, by: 'Ada' } },
		};
		const { locks } = signDraft(before, sent, 'Grace', '2026-12-01');
		expect(locks).toEqual({
			a: { ink: 0, cost: 1, by: 'Ada', at: '2026-01-01' },
			b: { ink: 0, cost: 1, by: 'Grace', at: '2026-12-01' },
		});
	});

	it('signs a lock anew when its ink or cost changes', () => {
		const sent = { ...draft, locks: { a: { ink: 1, cost: 1 } } };
		expect(signDraft(before, sent, 'Grace', 'now').locks.a).toMatchObject({ by: 'Grace' });
	});

	it('signs borders decided by hand, and keeps a signature while pair and reason stand', () => {
		const known = { a: 'a', b: 'b', reason: 'a lake', by: 'Ada', at: '2026-01-01' };
		const sent = {
			...draft,
			struck: [
				{ a: 'a', b: 'b', reason: 'a lake', by: 'Mallory' },
				{ a: 'a', b: 'c', reason: 'a lake' },
			],
			added: [{ a: 'a', b: 'd', reason: 'a ferry', by: 'Ada' }],
		};
		const signed = signDraft({ ...draft, struck: [known] }, sent, 'Grace', 'now');
		expect(signed.struck).toEqual([
			known,
			{ a: 'a', b: 'c', reason: 'a lake', by: 'Grace', at: 'now' },
		]);
		expect(signed.added).toEqual([{ a: 'a', b: 'd', reason: 'a ferry', by: 'Grace', at: 'now' }]);
	});

	it('signs ties, keeps their locks marked, and signs anew what another edition asks', () => {
		const tie = { sheet: 7, name: 'North', edition: 2, revision: 9 };
		const lock = { ink: 0, cost: 1, tie: 7 };
		const sent = { ...draft, ties: [{ ...tie, by: 'Mallory' }], locks: { a: lock } };
		const signed = signDraft(draft, sent, 'Ada', 'then');
		expect(signed.ties).toEqual([{ ...tie, by: 'Ada', at: 'then' }]);
		expect(signed.locks.a).toEqual({ ...lock, by: 'Ada', at: 'then' });
		expect(signDraft(signed, { ...signed }, 'Grace', 'now')).toEqual(signed);
		const refreshed = {
			...signed,
			ties: [{ ...tie, edition: 3 }],
			locks: { a: { ink: 0, cost: 1 } },
		};
		expect(signDraft(signed, refreshed, 'Grace', 'now')).toMatchObject({
			ties: [{ edition: 3, by: 'Grace', at: 'now' }],
			locks: { a: { ink: 0, cost: 1, by: 'Grace', at: 'now' } },
		});
	});
});
