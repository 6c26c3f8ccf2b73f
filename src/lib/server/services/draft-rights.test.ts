import { describe, expect, it } from 'vitest';
import { actions } from '../access/roles.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import { firstDraft } from './first-draft.ts';
import { changedParts, changesColouring, rightsFor, signLocks } from './draft-rights.ts';

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

describe('signing locks', () => {
	const before = { ...draft, locks: { a: { ink: 0, cost: 1, by: 'Ada', at: '2026-01-01' } } };

	it('never takes the word of the sender for who set a lock', () => {
		const sent = {
			...draft,
			locks: { a: { ink: 0, cost: 1, by: 'Mallory' }, b: { ink: 0, cost: 1, by: 'Ada' } },
		};
		const { locks } = signLocks(before, sent, 'Grace', '2026-12-01');
		expect(locks).toEqual({
			a: { ink: 0, cost: 1, by: 'Ada', at: '2026-01-01' },
			b: { ink: 0, cost: 1, by: 'Grace', at: '2026-12-01' },
		});
	});

	it('signs a lock anew when its ink or cost changes', () => {
		const sent = { ...draft, locks: { a: { ink: 1, cost: 1 } } };
		expect(signLocks(before, sent, 'Grace', 'now').locks.a).toMatchObject({ by: 'Grace' });
	});
});
