/**
 * Text widths and cut-down fonts against fontkit, an independent reader of the same font files.
 */
import { readFileSync } from 'node:fs';
import { create, type Font } from 'fontkit';
import { describe, expect, it } from 'vitest';
import { subsetFont } from '../../src/lib/engines/exports/index.ts';
import { faceStyles, isSetIn, textWidth, type Face } from '../../src/lib/engines/sheet/index.ts';

const faces = Object.keys(faceStyles) as Face[];
const fileOf = (face: Face): Buffer => readFileSync(`static/fonts/${face}.ttf`);
const off = { kern: false, liga: false, clig: false, calt: false, ccmp: false, locl: false };

const samples = [
	'Northumberland and Durham',
	'Šiauliai, Łódź, Győr, Çeşme, Ñuñoa',
	'Αθήνα Θεσσαλονίκη',
	'Санкт-Петербург, Київ',
	'AVATAR To Wa fi fl “quotes” – 1,234.5 km²',
];

describe('widths against fontkit', () => {
	it.each(faces)('%s', (face) => {
		const font = create(fileOf(face)) as Font;
		for (const text of samples) {
			expect(isSetIn(face, text)).toBe(true);
			const { advanceWidth } = font.layout(text, off);
			expect(textWidth(face, 250, text)).toBeCloseTo((advanceWidth * 250) / font.unitsPerEm, 6);
		}
	});

	it('reckons unknown characters wide and marks without width', () => {
		expect(textWidth('sans', 100, '漢')).toBe(100);
		expect(textWidth('sans', 100, 'e\u0306\u0f71')).toBe(textWidth('sans', 100, 'e\u0306'));
	});
});

describe('fonts cut down to a text', () => {
	it.each(faces)('%s keeps outlines and advances', (face) => {
		const whole = create(fileOf(face)) as Font;
		const text = samples.join('');
		const bytes = subsetFont(fileOf(face), text);
		const cut = create(Buffer.from(bytes)) as Font;
		expect(bytes.length).toBeLessThan(45_000);
		for (const character of new Set(text)) {
			const code = character.codePointAt(0)!;
			const [before, after] = [whole.glyphForCodePoint(code), cut.glyphForCodePoint(code)];
			expect(after.id, character).toBeGreaterThan(0);
			expect(after.advanceWidth).toBe(before.advanceWidth);
			expect(after.path.toSVG()).toBe(before.path.toSVG());
		}
		expect(cut.glyphForCodePoint('Ж'.codePointAt(0)!).id).toBe(0);
		expect(subsetFont(fileOf(face), text)).toEqual(bytes);
	});

	it('refuses what is no TrueType font', () => {
		expect(() => subsetFont(new Uint8Array(64), 'a')).toThrow(RangeError);
	});
});
