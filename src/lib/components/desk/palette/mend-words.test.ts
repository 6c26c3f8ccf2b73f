import { expect, it } from 'vitest';
import type { Proposal, ProposalAnswer } from '$lib/engines/palettes';
import { searchWords, together, unmendedWords } from './mend-words';

const proposal = (kind: Proposal['kind'], inks: string[]): Proposal => ({
	...{ kind, inks, moves: [4], moved: 1, total: 4, least: 13, leastGrey: 6 },
});
const found = (kind: Proposal['kind']): ProposalAnswer => ({
	...{ kind, status: 'proposed', proposal: proposal(kind, ['#111111']) },
});
const missed = (kind: Proposal['kind']): ProposalAnswer => ({
	...{ kind, status: 'not-found', reason: 'No set of 6 inks was found' },
});

it('one mend that is found says that what is asked can be reached: only the other ways are missing', () => {
	const words = unmendedWords([found('fewest'), found('least'), missed('grey'), missed('known')]);
	expect(words).toEqual([
		'Not found within the effort: one with gaps of 8 in L* and more for grey print; one from a well-known set.',
	]);
	expect(unmendedWords([found('fewest')])).toEqual([]);
});

it('without any mend the reason is told, once', () => {
	expect(unmendedWords([missed('fewest'), missed('least')])).toEqual([
		'No set of 6 inks was found.',
	]);
	expect(unmendedWords([{ status: 'impossible', reason: 'Red is locked' }])).toEqual([
		'Red is locked.',
	]);
	expect(unmendedWords([{ status: 'not-needed' }])).toEqual([]);
});

it('proposals that come to the same inks are one', () => {
	const blocks = together([
		proposal('fewest', ['#1']),
		proposal('grey', ['#2']),
		proposal('least', ['#1']),
	]);
	expect(blocks.map(({ kinds }) => kinds)).toEqual([['fewest', 'least'], ['grey']]);
});

it('the search says how far it is, and how it ended', () => {
	const at = { working: true, failure: '', found: 0, ended: false };
	expect(searchWords(at)).toBe('Looking for inks that every reader can tell apart.');
	expect(searchWords({ ...at, found: 2 })).toMatch(/; 2 found so far\.$/);
	const end = { ...at, working: false };
	expect(searchWords(end)).toBe('');
	expect(searchWords({ ...end, failure: 'out of memory' })).toContain('(out of memory)');
	expect(searchWords({ ...end, ended: true })).toBe('No mend was found.');
	expect(searchWords({ ...end, ended: true, found: 1 })).toBe('1 mend found.');
});
