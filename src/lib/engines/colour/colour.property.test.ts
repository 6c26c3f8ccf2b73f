import { differenceCiede2000, lab65, oklab, parse } from 'culori';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import {
	asSeenBy,
	channelsOf,
	ciede2000,
	contrast,
	hexOf,
	hexOfOklab,
	labelInk,
	labOf,
	oklabOf,
	readers,
	readHex,
	tritanSecondOpinion,
} from './index.ts';

const hex = fc.integer({ min: 0, max: 0xffffff }).map((n) => `#${n.toString(16).padStart(6, '0')}`);
const colour = (text: string) => parse(text) ?? expect.fail(`culori cannot read ${text}`);

it('agrees with culori on CIELAB D65 and OKLab', () => {
	fc.assert(
		fc.property(hex, (text) => {
			const [lab, ok] = [lab65(colour(text)), oklab(colour(text))];
			[lab.l, lab.a, lab.b].forEach((v, i) => expect(labOf(text)[i]).toBeCloseTo(v, 3));
			[ok.l, ok.a, ok.b].forEach((v, i) => expect(oklabOf(text)[i]).toBeCloseTo(v, 6));
		}),
	);
});

it('agrees with culori on CIEDE2000', () => {
	const other = differenceCiede2000();
	fc.assert(
		fc.property(hex, hex, (a, b) => {
			const theirs = other(lab65(colour(a)), lab65(colour(b)));
			expect(ciede2000(labOf(a), labOf(b))).toBeCloseTo(theirs, 3);
		}),
	);
});

it('is symmetric and 0 only for the same colour', () => {
	fc.assert(
		fc.property(hex, hex, (a, b) => {
			const [there, back] = [ciede2000(labOf(a), labOf(b)), ciede2000(labOf(b), labOf(a))];
			expect(there).toBeCloseTo(back, 9);
			expect(there === 0).toBe(a === b);
		}),
	);
});

it('comes back from OKLab and from channels unchanged', () => {
	fc.assert(
		fc.property(hex, (text) => {
			expect(hexOfOklab(oklabOf(text))).toBe(text);
			expect(hexOf(channelsOf(text))).toBe(text);
		}),
	);
});

it('leaves neutrals neutral for every reader, within one step of 8 bits', () => {
	fc.assert(
		fc.property(fc.integer({ min: 0, max: 255 }), fc.constantFrom(...readers), (grey, reader) => {
			const seen = channelsOf(asSeenBy(hexOf([grey / 255, grey / 255, grey / 255]), reader));
			for (const channel of seen) expect(Math.abs(channel * 255 - grey)).toBeLessThan(1.01);
		}),
	);
});

it('finds a label ink of at least 4.58:1 on any fill', () => {
	fc.assert(
		fc.property(hex, (text) => {
			expect(contrast(text, labelInk(text))).toBeGreaterThanOrEqual(4.58);
		}),
	);
});

it('keeps the second opinion on tritan readers within what a screen can show', () => {
	fc.assert(
		fc.property(hex, (text) => {
			for (const light of tritanSecondOpinion(channelsOf(text))) {
				expect(light).toBeGreaterThanOrEqual(0);
				expect(light).toBeLessThanOrEqual(1);
			}
		}),
	);
});

it.each([
	['#ABC', '#aabbcc'],
	[' e69f00 ', '#e69f00'],
	['#E69F00', '#e69f00'],
	['#e69f0', null],
	['#e69f00ff', null],
	['orange', null],
	['', null],
])('reads %j as %j', (text, read) => {
	expect(readHex(text)).toBe(read);
});

it('throws on a colour nobody has read first', () => {
	expect(() => channelsOf('tomato')).toThrow(RangeError);
});
