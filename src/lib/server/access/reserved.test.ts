import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isTeamSlug, reservedWords, slugFor } from './reserved.ts';

/** The check on the teams table in the first migration. */
const column = /^[a-z0-9][a-z0-9-]{1,48}$/;

describe('the word of a team in addresses', () => {
	it('fits the table’s own check, whatever the name and however many are taken', () => {
		fc.assert(
			fc.property(
				fc.string({ unit: 'binary' }),
				fc.integer({ min: 1, max: 9999 }),
				(name, place) => {
					const word = slugFor(name, place);
					expect(word).toMatch(column);
					expect(isTeamSlug(word)).toBe(true);
				},
			),
		);
	});

	it('is another one for each place in the queue', () => {
		fc.assert(
			fc.property(fc.string(), fc.integer({ min: 1, max: 500 }), (name, place) => {
				expect(slugFor(name, place)).not.toBe(slugFor(name, place + 1));
			}),
		);
	});

	it('is never one of the product’s', () => {
		for (const word of reservedWords) {
			expect(isTeamSlug(word)).toBe(false);
			expect(slugFor(word)).not.toBe(word);
		}
	});

	it.each([
		['Land Survey', 'land-survey'],
		['Tavaröe Survey Office', 'tavaroe-survey-office'],
		['  --North-- ', 'north'],
		['Teams', 'team-teams'],
		['測量局', 'team'],
	])('%s is read as %s', (name, word) => {
		expect(slugFor(name)).toMatch(new RegExp(`^${word}(-1)?$`));
	});
});
