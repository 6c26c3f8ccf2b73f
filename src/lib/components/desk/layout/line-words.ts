import { checkBorderLine } from '$lib/engines/palettes';
import type { Ink } from '$lib/engines/palettes/palette';
import type { LineLook, RankLook } from '$lib/engines/sheet/layout';

export type Rank = 'outer' | 'group' | 'region';
export const rankTitles: Record<Rank, string> = {
	outer: 'Outer boundary',
	group: 'Level above',
	region: 'Regions',
};

/** What a rank is set to when it is first set by hand: near what suits an A4 sheet. */
export const firstLook: Record<Rank, RankLook> = {
	outer: { widthMm: 0.3, hex: '#000000', dashMm: [] },
	group: { widthMm: 0.4, hex: '#000000', dashMm: [] },
	region: { widthMm: 0.15, hex: '#000000', dashMm: [] },
};

export const dashes: { value: string; label: string }[] = [
	{ value: '', label: 'whole' },
	{ value: '3 1.5', label: 'long dashes' },
	{ value: '1.2 0.8', label: 'short dashes' },
	{ value: '0.3 0.6', label: 'dots' },
	{ value: '3 0.8 0.4 0.8', label: 'dash and dot' },
];

/** `3 1.5` as millimetres; null where that is no dash. */
export function dashFrom(text: string): number[] | null {
	const parts = text.trim() ? text.trim().split(/[\s;]+/) : [];
	const lengths = parts.map((part) => Number(part.replace(',', '.')));
	const fit = lengths.length <= 8 && lengths.every((mm) => mm >= 0.05 && mm <= 50);
	return fit ? lengths : null;
}

/** How a line stands against the fills it may lie between, in a sentence. */
export function lineWords(hex: string, inks: readonly Ink[]): { passes: boolean; text: string } {
	const found = checkBorderLine(
		hex,
		inks.map((ink) => ink.hex),
	);
	const faint = found.filter(({ passes }) => !passes);
	if (faint.length === 0)
		return {
			passes: true,
			text: `At least 3 : 1 against ${inks.length === 1 ? 'the ink' : 'every ink'}.`,
		};
	const told = faint
		.sort((a, b) => a.contrast - b.contrast)
		.slice(0, 3)
		.map(({ ink, contrast }) => `${inks[ink].name || `ink ${ink + 1}`} ${contrast.toFixed(1)} : 1`);
	const more = faint.length > 3 ? ` and ${faint.length - 3} more` : '';
	return {
		passes: false,
		text: `Below 3 : 1 against ${told.join(', ')}${more}. Where it lies between such fills it is hard to see.`,
	};
}

/** What is set, for the section's heading. */
export function linesState({ outer, group, region, doubleWeak }: LineLook): string {
	const own = [outer, group, region].filter(Boolean).length;
	const ranks = own === 0 ? 'as suits the sheet' : `${own} of 3 ranks set`;
	return doubleWeak ? `${ranks}, double where missed` : ranks;
}
