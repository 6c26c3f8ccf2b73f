import { describe, expect, it } from 'vitest';
import type { Draft } from '../../engines/editions/draft.ts';
import { colouringParts } from './draft-rights.ts';
import { firstDraft } from './first-draft.ts';
import { problemDigest } from './problem-digest.ts';

const palette = { id: 'p', name: 'P', inks: [{ name: 'Ochre', hex: '#ebb855' }] };
const draft: Draft = {
	...firstDraft({ title: 'A sheet', palette, portrait: false }),
	locks: { a: { ink: 0, cost: 1, by: 'Ada', at: 'then' } },
	struck: [{ a: 'a', b: 'b', reason: 'a lake', by: 'Ada' }],
};
const digest = (change: Partial<Draft> = {}, set = 'one') =>
	problemDigest({ ...draft, ...change }, set);

describe('the digest of what a draft asks', () => {
	const others: { [Part in (typeof colouringParts)[number]]?: Draft[Part] } = {
		inks: 5,
		locks: { a: { ink: 0, cost: 2 } },
		forbidden: [{ key: 'a', ink: 1 }],
		alike: [['a', 'b']],
		apart: [['a', 'b']],
		groups: [{ kind: 'alike', name: 'G', keys: ['a', 'b'] }],
		reserved: [1],
		pointTouches: true,
		leastMetres: 4,
		waterKm: 3,
		struck: [],
		added: [{ a: 'a', b: 'c', reason: 'a ferry' }],
	};

	it.each(colouringParts.filter((part) => part !== 'seed'))('differs with %s', (part) => {
		expect(Object.hasOwn(others, part)).toBe(true);
		expect(digest({ [part]: others[part] })).not.toBe(digest());
	});

	it('differs with the boundaries', () => expect(digest({}, 'other')).not.toBe(digest()));

	it('is the same whatever the looks, the seed, the goals and the signatures', () => {
		const same: Partial<Draft> = {
			...{ seed: 7, goals: [{ kind: 'even-count', give: 0 }] },
			palette: { ...palette, name: 'Q' },
			layout: { ...draft.layout, title: 'Other' },
			locks: { a: { ink: 0, cost: 1, by: 'Grace' } },
			struck: [{ a: 'a', b: 'b', reason: 'a river' }],
		};
		expect(digest(same)).toBe(digest());
	});
});
