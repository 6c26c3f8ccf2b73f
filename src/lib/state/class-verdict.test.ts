import { expect, it } from 'vitest';
import { judgeRamp } from '$lib/engines/palettes';
import { classVerdict } from './class-verdict';
import { judgePalette } from './palette-judgement';

/** Four greys, 10 apart and more; the second and the third less than 15. */
const hexes = ['#f0f0f0', '#bbbbbb', '#969696', '#505050'];
const borders = {
	...{ a: Uint32Array.of(0), b: Uint32Array.of(1), kind: Uint8Array.of(0) },
	...{ metres: new Float64Array(1), at: new Float64Array(2) },
};
const sheet = (sizesMm: number[]) =>
	judgePalette({
		inks: hexes.map((hex, i) => ({ name: `class ${i + 1}`, hex })),
		...{ colouring: Int32Array.of(1, 2), borders, sizesMm },
	});

it('a class is clear where no reader takes it for another, in the legend or where it touches', () => {
	expect(classVerdict(0, judgeRamp(['#e8e8e8', '#404040']), null).kind).toBe('clear');
	expect(classVerdict(3, judgeRamp(hexes), sheet([20, 20])).kind).toBe('clear');
});

it('small regions ask more of the classes that touch, and of no others', () => {
	const large = [1, 2].map((one) => classVerdict(one, judgeRamp(hexes), sheet([20, 20])).kind);
	const small = [1, 2].map((one) => classVerdict(one, judgeRamp(hexes), sheet([20, 4])));
	expect(large).toEqual(['clear', 'clear']);
	expect(small.map(({ kind }) => kind)).toEqual(['warning', 'warning']);
	expect(small[0].readers).toContain('typical');
	expect(classVerdict(3, judgeRamp(hexes), sheet([20, 4])).kind).toBe('clear');
});

it('what is worse in the legend counts, though the classes do not touch', () => {
	const alike = judgeRamp(['#e8e8e8', '#808080', '#828282']);
	expect(classVerdict(2, alike, null)).toMatchObject({ kind: 'error' });
});
