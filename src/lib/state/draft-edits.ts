import type { Draft } from '$lib/engines/editions/draft';
import type { Ink, Palette } from '$lib/engines/palettes/palette';
import type { SheetLayout } from '$lib/engines/sheet/layout';

/** What people do to a draft, each a new draft; the old one is never touched. */

export const lock =
	(keys: readonly string[], ink: number, by?: string) =>
	(draft: Draft): Draft => {
		const at = new Date().toISOString().slice(0, 10);
		const locks = { ...draft.locks };
		for (const key of keys) locks[key] = { ink, cost: 1, ...(by ? { by } : {}), at };
		return { ...draft, locks };
	};

export const release =
	(keys: readonly string[]) =>
	(draft: Draft): Draft => {
		const gone = new Set(keys);
		const entries = Object.entries(draft.locks).filter(([key]) => !gone.has(key));
		return { ...draft, locks: Object.fromEntries(entries) };
	};

/** Enough inks for `inks`: the palette grows by greys that can be told apart until it is edited. */
export const useInks =
	(inks: number | 'fewest') =>
	(draft: Draft): Draft => ({
		...draft,
		inks,
		palette:
			inks === 'fewest' || inks <= draft.palette.inks.length
				? draft.palette
				: { ...draft.palette, inks: grown(draft.palette.inks, inks) },
	});

/** light to dark, so that added inks differ at least in lightness */
const spareGreys = ['#f2f2f2', '#8a8a8a', '#c4c4c4', '#5c5c5c', '#dddddd', '#a6a6a6'];

function grown(inks: readonly Ink[], to: number): Ink[] {
	const added = Array.from({ length: to - inks.length }, (_, index) => ({
		name: `Added ${index + 1}`,
		hex: spareGreys[index % spareGreys.length],
	}));
	return [...inks, ...added];
}

export const usePalette =
	({ id, name, inks }: Palette) =>
	(draft: Draft): Draft => ({
		...draft,
		palette: { id, name, inks: inks.map((ink) => ({ ...ink })) },
	});

/** Once an ink is changed by hand the palette is the sheet's own. */
export const changeInk =
	(number: number, change: Partial<Ink>) =>
	(draft: Draft): Draft => ({
		...draft,
		palette: {
			id: 'own',
			name: draft.palette.id === 'own' ? draft.palette.name : `${draft.palette.name}, changed`,
			inks: draft.palette.inks.map((ink, index) =>
				index === number ? { ...ink, ...change } : ink,
			),
		},
	});

export const setLayout =
	(change: Partial<SheetLayout>) =>
	(draft: Draft): Draft => ({ ...draft, layout: { ...draft.layout, ...change } });

export const countPointTouches =
	(pointTouches: boolean) =>
	(draft: Draft): Draft => ({ ...draft, pointTouches });

export const countLinesFrom =
	(leastMetres: number) =>
	(draft: Draft): Draft => ({ ...draft, leastMetres });

export const countWaterUpTo =
	(waterKm: number | null) =>
	(draft: Draft): Draft => ({ ...draft, waterKm });

type Pair = { a: string; b: string };
const samePair = (one: Pair, other: Pair) =>
	(one.a === other.a && one.b === other.b) || (one.a === other.b && one.b === other.a);
const inOrder = (a: string, b: string): Pair => (a < b ? { a, b } : { a: b, b: a });

/** Strikes a border out: these two may share an ink. A border added by hand is simply taken back. */
export const strike =
	(a: string, b: string, reason: string) =>
	(draft: Draft): Draft => {
		const pair = inOrder(a, b);
		if (draft.added.some((border) => samePair(border, pair)))
			return { ...draft, added: draft.added.filter((border) => !samePair(border, pair)) };
		return { ...draft, struck: [...draft.struck, { ...pair, reason }] };
	};

export const restoreBorder =
	(a: string, b: string) =>
	(draft: Draft): Draft => ({
		...draft,
		struck: draft.struck.filter((border) => !samePair(border, { a, b })),
	});

/** Adds a border by hand: these two must differ though they do not touch. */
export const addBorder =
	(a: string, b: string, reason: string) =>
	(draft: Draft): Draft => ({ ...draft, added: [...draft.added, { ...inOrder(a, b), reason }] });
