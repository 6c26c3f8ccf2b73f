import {
	bordersSentence,
	isUnsafe,
	judgeLabel,
	labelContrastAsked,
	pairDemands,
	pairsOnSheet,
	readers,
	weakBorders,
	type PairOnSheet,
	type SheetFills,
	type SheetLines,
} from '$lib/engines/palettes';
import type { Ink, LabelVerdict, Reader, WeakBorder } from '$lib/engines/palettes/palette';
import type { BorderList } from '$lib/engines/borders/border-list';
import { counted } from '$lib/components/format';
import type { MarkKind } from '$lib/components/Mark.svelte';

/** A border that a reader could miss, with the regions on both its sides. */
export interface WeakOnDesk extends WeakBorder {
	/** number in the sheet's list, -1 for a pair joined by hand alone, which has no line to be drawn */
	border: number;
	a: number;
	b: number;
}

/** A pair of inks on the sheet; `tightest` is a number in the list of borders that count. */
export interface PairOnDesk extends PairOnSheet {
	/** the regions on both sides of the tightest border, the smaller one first */
	at: [number, number];
	/** its number in the sheet's list, -1 where it was added by hand alone */
	border: number;
}

export interface PaletteJudgement {
	mark: MarkKind | null;
	sentence: string;
	pairs: PairOnDesk[];
	labels: LabelVerdict[];
	weak: WeakOnDesk[];
	/** pairs that some reader could take for one another */
	unsafe: PairOnDesk[];
	/** for each ink the readers who could take it for a neighbour's, and how badly */
	byInk: { readers: Reader[]; severity: 'error' | 'warning' }[];
	/** whether the sheet was measured; until then every region counts as of the usual size */
	measured: boolean;
}

export interface Judged {
	inks: readonly Ink[];
	colouring: Int32Array;
	/** the borders that count, those added by hand among them */
	borders: BorderList;
	/** number of each of them in the sheet's list, -1 for none; its own number when absent */
	numbers?: Int32Array;
	/** printed size of each region, mm; null until the sheet is drawn */
	sizesMm: ArrayLike<number> | null;
	/** colours of its border lines; black when absent */
	lines?: SheetLines;
	/** the level above of each region, whether the sheet says a region's name: as for `pairDemands` */
	groups?: SheetFills['groups'];
	labelled?: SheetFills['labelled'];
}

const blackLines: SheetLines = { region: '#000000', group: '#000000' };

/** Until the sheet is drawn nobody knows how large regions show; this size asks for the usual 12. */
const usualSizeMm = 5;

/** How the palette fares on this sheet at its printed size, for every reader, along the borders that count. */
export function judgePalette({
	inks,
	borders,
	numbers,
	sizesMm,
	lines = blackLines,
	groups,
	labelled,
	...given
}: Judged): PaletteJudgement {
	const colouring = given.colouring.map((ink) => (ink < inks.length ? ink : -1));
	const sheet = {
		...{ borders, colouring, groups, labelled, pointTouches: true },
		inks: inks.map(({ hex }) => hex),
		hatches: inks.map(({ hatch }) => hatch),
		sizesMm: sizesMm ?? new Float64Array(colouring.length).fill(usualSizeMm),
	};
	const numberOf = (border: number) => numbers?.[border] ?? border;
	const weak = weakBorders(sheet);
	const pairs = pairsOnSheet(inks, pairDemands(sheet), lines).map((pair): PairOnDesk => {
		const [a, b] = [borders.a[pair.tightest], borders.b[pair.tightest]];
		const smallerFirst = sheet.sizesMm[a] <= sheet.sizesMm[b];
		return { ...pair, at: smallerFirst ? [a, b] : [b, a], border: numberOf(pair.tightest) };
	});
	return {
		...stateOf(pairs, weak.length ? bordersSentence(weak, borders, colouring, inks) : '', inks),
		pairs,
		labels: sheet.inks.map((hex, ink) => judgeLabel(hex, ink, labelContrastAsked)),
		weak: weak.map((one) => ({
			...one,
			...{ border: numberOf(one.border), a: borders.a[one.border], b: borders.b[one.border] },
		})),
		unsafe: pairs.filter(isUnsafe),
		byInk: weakByInk(inks.length, weak, borders, colouring),
		measured: sizesMm !== null,
	};
}

/** The mark and one sentence: weak borders first, then what else is missing. */
function stateOf(
	pairs: readonly PairOnDesk[],
	weak: string,
	inks: readonly Ink[],
): Pick<PaletteJudgement, 'mark' | 'sentence'> {
	if (pairs.length === 0) return { mark: null, sentence: 'No inks touch yet' };
	const mark = (['error', 'warning'] as const).find((kind) =>
		pairs.some((pair) => pair.mark === kind),
	);
	if (weak) return { mark: mark === 'error' ? 'error' : 'warning', sentence: weak };
	const line = pairs.find(({ line }) => !line.passes);
	const bare = pairs.find(({ beside }) => beside === 'nothing');
	const names = (pair: PairOnDesk) => `${inks[pair.a].name} and ${inks[pair.b].name}`;
	if (line)
		return {
			mark: 'warning',
			sentence: `Every reader can tell the fills apart, but the border line between ${names(line)} is too close to one of them`,
		};
	if (bare)
		return {
			mark: 'warning',
			sentence: `Every reader can tell the fills apart, but ${counted(bare.bare, 'region')} of ${names(bare)} under 3.5 mm ${bare.bare === 1 ? 'has' : 'have'} neither a label nor a hatch`,
		};
	return { mark: 'clear', sentence: 'Every reader can tell apart all inks that touch' };
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

/** The number in the sheet's whole list of every border that counts, -1 for pairs joined by hand alone. */
export function numbersIn(whole: BorderList, counting: BorderList): Int32Array {
	let at = 0;
	return Int32Array.from(counting.a, (a, i) => {
		const b = counting.b[i];
		while (at < whole.a.length && (whole.a[at] < a || (whole.a[at] === a && whole.b[at] < b))) at++;
		return whole.a[at] === a && whole.b[at] === b ? at : -1;
	});
}
