import { describe, expect, it } from 'vitest';
import { explanationSentence } from './explanation-sentence.ts';

const names = ['Ash', 'Birch', 'Cedar', 'Dogwood', 'Elm', 'Fir'];
const plain = { rules: [], regions: [], release: null, inksThatWouldDo: null };

describe('why there is no colouring, in words', () => {
	it('names the locks that collide, the way out, and the inks that would do', () => {
		const found = {
			...plain,
			locks: [0, 1],
			release: { locks: [1], cost: 1, proved: true, lowerBound: 1 },
			inksThatWouldDo: 5,
		};
		expect(explanationSentence(found, names)).toBe(
			'The locks of Ash and Birch cannot all be kept. Dropping the lock of Birch frees the rest, ' +
				'and nothing cheaper does. With 5 inks everything could be kept.',
		);
	});

	it('counts what it does not name', () => {
		expect(explanationSentence({ ...plain, locks: [0, 1, 2, 3, 4, 5] }, names)).toBe(
			'The locks of Ash, Birch, Cedar, Dogwood and 2 more cannot all be kept.',
		);
	});

	it('names the rules when no lock is to blame', () => {
		const rules = [
			{ kind: 'border', a: 0, b: 1 },
			{ kind: 'alike', a: 0, b: 1 },
			{ kind: 'inks', inks: 4 },
		] as const;
		expect(explanationSentence({ ...plain, locks: [], rules: [...rules] }, names)).toBe(
			'These rules cannot all be kept: Ash borders Birch; Ash is kept like Birch and there are 4 inks.',
		);
	});
});
