import { z } from 'zod';
import { readHex } from '../engines/colour/hex.ts';
import type { Ink } from '../engines/palettes/palette.ts';

/** A palette as people paste it: one ink a line or separated by commas, each as `readInk` reads it. */
export const inkList = z
	.string()
	.max(10_000)
	.transform((text, context): Ink[] => {
		const entries = text
			.split(/[\n,;]+/)
			.map((entry) => entry.trim())
			.filter(Boolean);
		const read = entries.map(readInk);
		const wrong = read.find((one) => typeof one === 'string');
		if (wrong) context.addIssue(wrong);
		if (read.length === 0) context.addIssue('Paste at least one colour.');
		if (read.length > 64) context.addIssue('A palette has at most 64 inks.');
		return read.filter((one) => typeof one !== 'string').map(named);
	});

/**
 * One ink of a pasted palette, or what is wrong with it. Its value is the first or the last word, in
 * quotes or brackets or not; the other words are its name: `#ebb855 Ochre`, `Ochre: EBB855`.
 *
 * A word with `#` before it is meant as a value, so a bare one is looked for only where neither end has
 * one, and a first word with `#` that is no colour spoils the entry. Where both ends could be the value,
 * neither is guessed.
 */
function readInk(entry: string): Ink | string {
	const words = entry.split(/\s+/);
	const places = valuePlaces(words.map((word) => word.replace(/^["'(]+|["'):]+$/g, '')));
	if (places.length > 1)
		return `“${entry}” has two values: write one ink a line, its value with #.`;
	const [place] = places;
	const hex = place === undefined ? null : readHex(words[place].replace(/["'():]/g, ''));
	if (!hex) return `“${entry}” is not a colour: write # and six hex digits, then the name.`;
	const name = words.filter((_, other) => other !== place).join(' ');
	return { name: name.replace(/^["']+|["':]+$/g, '').slice(0, 80), hex };
}

/** Which of the first and the last word can be a value. */
function valuePlaces(words: readonly string[]): number[] {
	const ends = words.length > 1 ? [0, words.length - 1] : [0];
	if (words[0].startsWith('#') && !readHex(words[0])) return [];
	const marked = ends.filter((end) => words[end].startsWith('#'));
	if (marked.length) return marked.filter((end) => readHex(words[end]));
	return ends.filter((end) => isBareValue(words[end], words.length === 1));
}

/** Three letters beside other words are a word themselves: `Bad`, `Fee`. */
const isBareValue = (word: string, alone: boolean): boolean =>
	readHex(word) !== null && (alone || !/^[a-f]{3}$/i.test(word));

const named = (ink: Ink, number: number): Ink => ({
	...ink,
	name: ink.name || `Ink ${number + 1}`,
});

export const newPalette = z.object({
	name: z.string().trim().min(1, 'Give the palette a name.').max(120),
	inks: inkList,
});

/** What the page of palettes sends to have one deleted. */
export const paletteId = z.object({ id: z.uuid() });

/** What it sends to have one copied: an id of the team's, the house's or a published one. */
export const paletteToCopy = z.object({ id: z.string().min(1).max(100) });
