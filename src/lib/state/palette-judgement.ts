import { bordersSentence, checkPalette, readers, weakBorders } from '$lib/engines/palettes';
import type { Ink, PaletteVerdict, Reader, WeakBorder } from '$lib/engines/palettes/palette';
import type { BorderList } from '$lib/engines/borders/border-list';
import type { MarkKind } from '$lib/components/Mark.svelte';
import { touchingInks } from './ink-use';
import type { Standing } from '$lib/engines/borders/standing';

export interface PaletteJudgement {
	mark: MarkKind | null;
	sentence: string;
	touching: [number, number][];
	verdict: PaletteVerdict;
	weak: WeakBorder[];
	/** for each ink the readers who could take it for a neighbour's, and how badly */
	byInk: { readers: Reader[]; severity: 'error' | 'warning' }[];
}

/** Until the sheet is drawn nobody knows how large regions show; this size asks for the usual 12. */
const usualSizeMm = 5;

/** How the palette fares on this sheet, for every reader, along the borders that count. */
export function judgePalette(
	inks: readonly Ink[],
	colouring: Int32Array,
	borders: BorderList,
	standing: readonly Standing[],
	sizesMm: ArrayLike<number> | null,
): PaletteJudgement {
	const counting = keep(borders, standing);
	const hexes = inks.map(({ hex }) => hex);
	const shown = colouring.map((ink) => (ink < inks.length ? ink : -1));
	const touching = touchingInks(shown, counting.borders);
	const weak = weakBorders({
		borders: counting.borders,
		colouring: shown,
		inks: hexes,
		sizesMm: sizesMm ?? new Float64Array(colouring.length).fill(usualSizeMm),
		pointTouches: true,
	});
	return {
		mark: !touching.length ? null : markOf(weak),
		sentence: touching.length
			? bordersSentence(weak, counting.borders, shown, inks)
			: 'No inks touch yet',
		touching,
		verdict: checkPalette(hexes, touching),
		weak: weak.map((one) => ({ ...one, border: counting.numbers[one.border] })),
		byInk: weakByInk(inks.length, weak, counting.borders, shown),
	};
}

function weakByInk(
	inks: number,
	weak: readonly WeakBorder[],
	borders: BorderList,
	colouring: ArrayLike<number>,
): PaletteJudgement['byInk'] {
	const found = Array.from({ length: inks }, () => ({
		readers: new Set<Reader>(),
		severity: 'warning' as 'error' | 'warning',
	}));
	for (const { border, reader, severity } of weak)
		for (const region of [borders.a[border], borders.b[border]]) {
			const of = found[colouring[region]];
			of.readers.add(reader);
			if (severity === 'error') of.severity = 'error';
		}
	return found.map(({ readers: seen, severity }) => ({
		readers: readers.filter((reader) => seen.has(reader)),
		severity,
	}));
}

const markOf = (weak: readonly WeakBorder[]): MarkKind =>
	weak.some(({ severity }) => severity === 'error') ? 'error' : weak.length ? 'warning' : 'clear';

/** The borders that count, with their numbers in the whole list. */
function keep(list: BorderList, standing: readonly Standing[]) {
	const numbers = standing.flatMap((one, border) => (one === 'counts' ? [border] : []));
	const borders: BorderList = {
		a: Uint32Array.from(numbers, (border) => list.a[border]),
		b: Uint32Array.from(numbers, (border) => list.b[border]),
		kind: Uint8Array.from(numbers, (border) => list.kind[border]),
		metres: Float64Array.from(numbers, (border) => list.metres[border]),
		at: new Float64Array(2 * numbers.length),
	};
	return { borders, numbers };
}
