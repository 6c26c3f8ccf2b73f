import { expect, it } from 'vitest';
import { checkBorderLine, housePalettes, inkDistances, tritanDoubts } from './index.ts';

const four = housePalettes[0].inks.map((ink) => ink.hex);

it('measures inks by the reader who sees them least apart', () => {
	const distances = inkDistances(['#e41a1c', '#a65628']);
	expect(distances[0][0]).toBe(0);
	expect(distances[0][1]).toBeCloseTo(distances[1][0], 9);
	// 3.1 for protan readers: the least of Brewer's Set1, measured apart from this product
	expect(distances[0][1]).toBeCloseTo(3.1, 1);
});

it('doubts a pair that only the newer model tells apart for tritan readers', () => {
	// Okabe and Ito's orange and reddish purple: 10.9 by Machado et al., 7.9 by Brettel et al.
	const inks = ['#e69f00', '#cc79a7'];
	const doubts = tritanDoubts(inks, 'all', 10);
	expect(doubts).toMatchObject([{ a: 0, b: 1 }]);
	expect(doubts[0].ciede2000).toBeCloseTo(7.9, 1);
	expect(tritanDoubts(inks, 'all', 12)).toEqual([]);
	expect(tritanDoubts(inks, 'all', 7)).toEqual([]);
	expect(tritanDoubts(four, 'all')).toEqual([]);
});

it('finds that a black line stands 3:1 against every house ink, and a grey one does not', () => {
	for (const { inks } of housePalettes) {
		const black = checkBorderLine(
			'#000000',
			inks.map((ink) => ink.hex),
		);
		expect(black.every((one) => one.passes)).toBe(true);
	}
	expect(checkBorderLine('#949494', four).some((one) => !one.passes)).toBe(true);
	// Understanding success criterion 1.4.11: #949494 reaches 3:1 on white
	expect(checkBorderLine('#949494', ['#ffffff'])[0].passes).toBe(true);
});
