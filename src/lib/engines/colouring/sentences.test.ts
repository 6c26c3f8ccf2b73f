import { describe, expect, it } from 'vitest';
import { cycle, fixtureGraph, fromPairs, join } from '../../../../tests/support/named-graphs.ts';
import { colour } from './colour.ts';
import { explanationSentence } from './explanation-sentence.ts';
import { proofSentence } from './proof-sentence.ts';

const names = ['Elnes', 'Arvik', 'Borg', 'Tofte', 'Dalen', 'Eide', 'Foss', 'Grue', 'Hov', 'Inset'];
const nameOf = (region: number) => names[region];

async function sentence(map: ReturnType<typeof cycle>): Promise<string> {
	const result = await colour({ ...map, inks: 'fewest' });
	if (result.status !== 'coloured') throw new Error('not coloured');
	return proofSentence(result, nameOf);
}

describe('sentences', () => {
	it('tell a proof in the words of the trade', async () => {
		expect(await sentence(fromPairs(0, []))).toBe('There is nothing to colour.');
		expect(await sentence(fromPairs(2, []))).toBe('No two regions must differ: one ink does.');
		expect(await sentence(fromPairs(2, [[0, 1]]))).toMatch(
			/^Two inks are needed because .* border\.$/,
		);
		expect(await sentence(cycle(5))).toMatch(/^Three .* five regions form a ring of odd length: /);
		expect(await sentence(cycle(3))).toMatch(/^Three /);
		const wheel = join(fromPairs(1, []), cycle(5));
		expect(await sentence(wheel)).toMatch(
			/^Four inks are needed because five regions round Elnes form a ring of odd length: /,
		);
		expect(await sentence(fixtureGraph('moser'))).toMatch(/^Four inks .* with three inks; /);
	});

	it('tell which locks collide and the way out', async () => {
		const locks = Int32Array.of(2, 2, -1);
		const map = fromPairs(3, [
			[0, 1],
			[1, 2],
		]);
		const result = await colour({ ...map, inks: 4, locks });
		if (result.status !== 'impossible') throw new Error('not impossible');
		const told = explanationSentence(result.explanation, nameOf, (ink) => `ink ${ink}`);
		expect(told).toMatch(
			/^Elnes and Arvik cannot both keep their locks, whatever the number of inks/,
		);
		expect(told).toMatch(/Dropping the lock of (Elnes|Arvik) makes it possible; nothing cheaper/);
	});
});
