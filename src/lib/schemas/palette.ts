import { z } from 'zod';
import type { Ink } from '../engines/palettes/palette.ts';

/**
 * A palette as people paste it: one ink a line or separated by commas, hex digits with or without `#`,
 * in any order with a name beside them: `#ebb855 Ochre`.
 */
export const inkList = z
	.string()
	.max(10_000)
	.transform((text, context): Ink[] => {
		const entries = text
			.split(/[\n,;]+/)
			.map((entry) => entry.trim())
			.filter(Boolean);
		const inks = entries.map(readInk);
		const wrong = inks.indexOf(null);
		if (wrong >= 0) context.addIssue(`“${entries[wrong]}” is no colour: write six hex digits.`);
		if (inks.length === 0) context.addIssue('Paste at least one colour.');
		if (inks.length > 64) context.addIssue('A palette has at most 64 inks.');
		return inks.filter((entry) => entry !== null).map(named);
	});

function readInk(entry: string): Ink | null {
	const found = /(?:^|[\s"'(])#?([0-9a-f]{6}|[0-9a-f]{3})(?=$|[\s"')])/i.exec(entry);
	if (!found) return null;
	const digits = found[1].toLowerCase();
	const hex = digits.length === 3 ? [...digits].map((digit) => digit + digit).join('') : digits;
	const name = entry
		.replace(found[0], ' ')
		.replace(/["'():]+/g, ' ')
		.replace(/\s+/g, ' ')
		.trim()
		.slice(0, 80);
	return { name, hex: `#${hex}` };
}

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
