import { describe, expect, it } from 'vitest';
import { judgePalette, numbersIn } from './palette-judgement';

const inks = [
	{ name: 'Poppy', hex: '#e41a1c' },
	{ name: 'Leather', hex: '#a65628' },
	{ name: 'Chalk', hex: '#f2f2f2' },
];
const list = (pairs: [number, number, number?][]) => ({
	a: Uint32Array.from(pairs, ([a]) => a),
	b: Uint32Array.from(pairs, ([, b]) => b),
	kind: Uint8Array.from(pairs, ([, , kind]) => kind ?? 0),
	metres: new Float64Array(pairs.length),
	at: new Float64Array(2 * pairs.length),
});
const hand = 3;
const whole = list([
	[0, 1],
	[1, 2, 1],
]);
const colouring = Int32Array.of(0, 2, 1);

describe('the palette on a sheet', () => {
	it('is judged along pairs joined by hand alone as well', () => {
		const borders = list([
			[0, 1],
			[0, 2, hand],
		]);
		const numbers = numbersIn(whole, borders);
		expect([...numbers]).toEqual([0, -1]);
		const judged = judgePalette({ inks, colouring, borders, numbers, sizesMm: [9, 20, 20] });
		expect(judged.mark).toBe('error');
		expect(judged.sentence).toMatch(/^Poppy and Leather look alike to .*protan.* along 1 border$/);
		expect(judged.unsafe.map(({ a, b, at, border }) => [a, b, at, border])).toEqual([
			[0, 1, [0, 2], -1],
		]);
		expect(judged.weak.every(({ border, a, b }) => border === -1 && a === 0 && b === 2)).toBe(true);
	});

	it('asks more on smaller paper, and the usual 12 until the sheet is drawn', () => {
		const borders = list([[0, 1]]);
		const asked = (sizesMm: number[] | null) =>
			judgePalette({ inks, colouring, borders, sizesMm }).pairs[0].ciede2000;
		expect([asked([20, 20, 20]), asked([8, 20, 20]), asked([4, 20, 20]), asked(null)]).toEqual([
			10, 12, 15, 12,
		]);
	});

	it('says that no inks touch where none do', () => {
		const none = judgePalette({ inks, colouring, borders: list([]), sizesMm: null });
		expect(none).toMatchObject({ mark: null, sentence: 'No inks touch yet', pairs: [] });
	});

	it('warns of a border line too close to a fill, and of small regions that only a fill tells', () => {
		const borders = list([[0, 1]]);
		const line = judgePalette({
			...{ inks, colouring, borders, sizesMm: [9, 9, 9] },
			lines: { region: '#e5e5e5', group: '#000000' },
		});
		expect(line).toMatchObject({ mark: 'warning', weak: [] });
		expect(line.sentence).toContain('the border line between Poppy and Chalk');
		const small = { inks, colouring, borders, sizesMm: [2, 9, 9] };
		expect(judgePalette(small)).toMatchObject({
			mark: 'warning',
			sentence: expect.stringMatching(
				/but 1 region of Poppy and Chalk under 3.5 mm has neither a label nor a hatch$/,
			),
		});
		// a name on the large region beside it does not help the small one
		expect(judgePalette({ ...small, labelled: (region) => region === 1 }).mark).toBe('warning');
		expect(judgePalette({ ...small, labelled: (region) => region === 0 }).mark).toBe('clear');
	});

	it('looks at the line that is drawn: between two of the level above it is another', () => {
		const borders = list([[0, 1]]);
		const pale = { region: '#000000', group: '#e5e5e5' };
		const markOf = (groups?: string[]) =>
			judgePalette({ inks, colouring, borders, sizesMm: [9, 9, 9], lines: pale, groups }).mark;
		expect([markOf(), markOf(['n', 'n', 's']), markOf(['n', 's', 's'])]).toEqual([
			...['clear', 'clear', 'warning'],
		]);
	});
});
