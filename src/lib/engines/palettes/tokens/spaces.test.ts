import { converter, type Color } from 'culori';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { oklabOfLinear, type Triple } from '../../colour/index.ts';
import { inGamut, intoGamut } from './gamut.ts';
import { tokenSpaces } from './spaces.ts';

const toLinear = converter('lrgb');
const unit = fc.double({ min: 0, max: 1, noNaN: true });
const percent = fc.integer({ min: 0, max: 100 });
const hue = fc.integer({ min: 0, max: 359 });

/** space, components in the report's ranges, the same colour as culori writes it */
const spaces: [string, fc.Arbitrary<Triple>, (components: Triple) => Color][] = [
	['srgb', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'rgb', r, g, b })],
	['srgb-linear', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'lrgb', r, g, b })],
	[
		'hsl',
		fc.tuple(hue, percent, percent),
		([h, s, l]) => ({ mode: 'hsl', h, s: s / 100, l: l / 100 }),
	],
	[
		'hwb',
		fc.tuple(hue, percent, percent),
		([h, w, b]) => ({ mode: 'hwb', h, w: w / 100, b: b / 100 }),
	],
	['lab', fc.tuple(percent, percent, percent), ([l, a, b]) => ({ mode: 'lab', l, a, b })],
	['lch', fc.tuple(percent, percent, hue), ([l, c, h]) => ({ mode: 'lch', l, c, h })],
	['oklab', fc.tuple(unit, unit, unit), ([l, a, b]) => ({ mode: 'oklab', l, a, b })],
	['oklch', fc.tuple(unit, unit, hue), ([l, c, h]) => ({ mode: 'oklch', l, c, h })],
	['display-p3', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'p3', r, g, b })],
	['a98-rgb', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'a98', r, g, b })],
	['prophoto-rgb', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'prophoto', r, g, b })],
	['rec2020', fc.tuple(unit, unit, unit), ([r, g, b]) => ({ mode: 'rec2020', r, g, b })],
	['xyz-d65', fc.tuple(unit, unit, unit), ([x, y, z]) => ({ mode: 'xyz65', x, y, z })],
	['xyz-d50', fc.tuple(unit, unit, unit), ([x, y, z]) => ({ mode: 'xyz50', x, y, z })],
];

describe('colour spaces of the report', () => {
	it('are the fourteen of the Color Module 2025.10, "Supported color spaces"', () => {
		expect(spaces.map(([name]) => name).sort()).toEqual(Object.keys(tokenSpaces).sort());
	});

	// reference library: culori 4.0.2; its rounded matrices of some spaces allow 0.002
	it.each(spaces)('%s comes to what culori makes of it', (name, components, written) => {
		fc.assert(
			fc.property(components, (triple) => {
				const ours = tokenSpaces[name](triple);
				const theirs = toLinear(written(triple));
				const scale = Math.max(1, ...ours.map(Math.abs));
				[theirs.r, theirs.g, theirs.b].forEach((channel, i) => {
					expect(Math.abs(ours[i] - channel) / scale).toBeLessThan(0.002);
				});
			}),
		);
	});
});

describe('a colour that sRGB cannot show', () => {
	it('keeps lightness and hue, loses chroma, and is shown by sRGB', () => {
		fc.assert(
			fc.property(fc.tuple(unit, unit, unit), (p3) => {
				const linear = tokenSpaces['display-p3'](p3);
				const [before, after] = [oklabOfLinear(linear), oklabOfLinear(intoGamut(linear))];
				expect(inGamut(intoGamut(linear))).toBe(true);
				if (inGamut(linear)) expect(intoGamut(linear)).toEqual(linear);
				else if (before[0] < 1) {
					expect(after[0]).toBeCloseTo(before[0], 6);
					expect(before[1] * after[2] - before[2] * after[1]).toBeCloseTo(0, 6);
					expect(Math.hypot(after[1], after[2])).toBeLessThan(Math.hypot(before[1], before[2]));
				}
			}),
		);
	});
});
