import { describe, expect, it } from 'vitest';
import type { DeskColouring } from '$lib/schemas/desk';
import { duration, openWords, searchChoices } from './search-words';

const coloured = (inksUsed: number, lowerBound: number, kind: 'not-proved' | 'clique') =>
	({
		...{ status: 'coloured', inks: [], inksUsed, lowerBound, sentence: '' },
		proof: { kind, regions: [] },
	}) as DeskColouring;

describe('what a colouring leaves open', () => {
	it.each([
		[8, 7, 'At least 7 inks are needed; 8 do. Whether 7 do is not known.'],
		[8, 6, 'At least 6 inks are needed; 8 do. Whether fewer than 8 do is not known.'],
		[7, 7, '7 inks do. That no fewer do is not proved.'],
	])('%i inks, at least %i', (used, least, words) => {
		expect(openWords(coloured(used, least, 'not-proved'), 'fewest')).toBe(words);
	});

	it('is nothing once it is proved, or where so many inks were asked for', () => {
		expect(openWords(coloured(7, 7, 'clique'), 'fewest')).toBeNull();
		expect(openWords(coloured(7, 6, 'not-proved'), 7)).toBeNull();
	});

	it('is the answer itself where none was found', () => {
		const undecided = { status: 'undecided', lowerBound: 4, message: '', sentence: '' } as const;
		expect(openWords(undecided, 5)).toContain('with 5 inks');
	});
});

describe('how long', () => {
	it('is estimated from the first try where that is known', () => {
		expect(searchChoices(null).map(({ label }) => label)).toEqual([
			...['20 times as long', '200 times as long', '2,000 times as long'],
		]);
		expect(searchChoices(4_500).map(({ label }) => label.split(': ')[1])).toEqual([
			...['up to 2 minutes', 'up to 15 minutes', 'up to 3 hours'],
		]);
	});

	it.each([
		[20, '1 second'],
		[89_400, '89 seconds'],
		[120_000, '2 minutes'],
		[7_200_000, '2 hours'],
	])('%i ms', (milliseconds, words) => expect(duration(milliseconds)).toBe(words));
});
