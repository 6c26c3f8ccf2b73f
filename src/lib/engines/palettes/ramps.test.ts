import { describe, expect, it } from 'vitest';
import { labOf } from '../colour/index.ts';
import { rampInks } from './ramp-inks.ts';
import { judgeRamp } from './ramp-verdict.ts';
import { ramps } from './ramps.ts';

const light = (hexes: string[]) => hexes.map((hex) => labOf(hex)[0]);

describe('ramps', () => {
	it.each(ramps.map((ramp) => [ramp.id, ramp] as const))(
		'%s avoids near-white and black',
		(_, ramp) => {
			for (const classes of [1, 2, 5, 12]) {
				const inks = rampInks(ramp, classes);
				expect(inks).toHaveLength(classes);
				for (const hex of inks) expect(hex).toMatch(/^#[0-9a-f]{6}$/);
				// half a step of an 8-bit channel either way
				expect(Math.max(...light(inks))).toBeLessThan(92.6);
				expect(Math.min(...light(inks))).toBeGreaterThan(23.4);
				const round = rampInks(ramp, classes, { reversed: true });
				if (ramp.kind === 'sequential') expect(round).toEqual([...inks].reverse());
			}
		},
	);

	it.each(
		ramps.filter(({ kind }) => kind === 'sequential').map((ramp) => [ramp.id, ramp] as const),
	)('%s keeps its order in grey print up to nine classes', (_, ramp) => {
		for (let classes = 2; classes <= 9; classes++) {
			const { ordered, readers } = judgeRamp(rampInks(ramp, classes));
			expect(ordered).toBe(true);
			const grey = readers.find(({ reader }) => reader === 'grey');
			expect(grey?.found).toBeGreaterThan(7);
		}
	});

	it('of the house are clear to every reader in five classes', () => {
		for (const ramp of ramps.filter(({ id }) => ['house-dusk', 'house-slate'].includes(id))) {
			const { readers } = judgeRamp(rampInks(ramp, 5));
			expect(readers.map(({ severity }) => severity)).toEqual(Array(5).fill('clear'));
		}
	});

	it('are told with reader and pair where they do not pass', () => {
		const puor = ramps.find(({ id }) => id === 'puor') ?? expect.fail('no such ramp');
		const verdict = judgeRamp(rampInks(puor, 5));
		expect(verdict.usable).toBe(false);
		expect(verdict.readers.filter(({ severity }) => severity === 'error')).toMatchObject([
			{ reader: 'grey', a: 1, b: 3 },
		]);
	});

	it('are told class by class, not by the closest pair alone', () => {
		const own = ramps.find(({ id }) => id === 'house-ochre-slate') ?? expect.fail('no such ramp');
		const hexes = rampInks(own, 7);
		const { byClass, readers } = judgeRamp(hexes);
		// both sides of the middle take equal steps of L*, so that 1 and 7, 2 and 6, 3 and 5 print alike
		expect(byClass.map(({ readers: close }) => close.includes('grey'))).toEqual([
			...[true, true, true, false, true, true, true],
		]);
		expect(byClass.filter(({ severity }) => severity === 'error').length).toBeGreaterThan(
			new Set(readers.filter(({ reader }) => reader === 'grey').flatMap(({ a, b }) => [a, b])).size,
		);
		// each class on its own, measured anew against every other
		byClass.forEach(({ severity }, one) => {
			const others = hexes.filter((_, other) => other !== one);
			const worst = others.map((hex) => judgeRamp([hexes[one], hex]).readers).flat();
			const bad = worst.some((verdict) => verdict.severity === 'error');
			expect(severity === 'error').toBe(bad);
		});
	});

	it('are told where the border line that is drawn is lost on them', () => {
		const dark = ['#f0f0f0', '#303030'];
		expect(judgeRamp(dark).faintLines).toEqual([1]);
		expect(judgeRamp(dark, '#ffffff').faintLines).toEqual([0]);
	});

	it('to both sides turn where they are asked to', () => {
		const own = ramps.find(({ id }) => id === 'house-ochre-slate') ?? expect.fail('no such ramp');
		const lightness = light(rampInks(own, 5, { turn: 1 }));
		expect(lightness.indexOf(Math.max(...lightness))).toBeLessThan(2);
		expect(lightness[4]).toBeLessThan(lightness[2]);
		const [a, b, c, d] = light(rampInks(own, 4));
		expect(Math.abs(a - d)).toBeLessThan(1);
		expect(Math.abs(b - c)).toBeLessThan(1);
	});
});
