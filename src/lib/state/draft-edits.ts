import type { Draft } from '$lib/engines/editions/draft';
import { inkDistances } from '$lib/engines/palettes/ink-distances';
import type { Ink, Palette } from '$lib/engines/palettes/palette';
import type { SheetLayout } from '$lib/engines/sheet/layout';

/** What people do to a draft, each a new draft; the old one is never touched. */

export const lock =
	(keys: readonly string[], ink: number, by?: string) =>
	(draft: Draft): Draft => {
		const at = new Date().toISOString().slice(0, 10);
		const locks = { ...draft.locks };
		for (const key of keys) {
			const cost = draft.locks[key]?.cost ?? 1;
			locks[key] = { ink, cost, ...(by ? { by } : {}), at };
		}
		return { ...draft, locks };
	};

/** What dropping a lock costs, against other locks: above 0, at most `mostWeight`. */
export const weigh =
	(key: string, cost: number) =>
	(draft: Draft): Draft => {
		const pinned = draft.locks[key];
		if (!pinned || pinned.cost === cost || !(cost > 0) || cost > mostWeight) return draft;
		return { ...draft, locks: { ...draft.locks, [key]: { ...pinned, cost } } };
	};
export const mostWeight = 1e9;

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

/** Each added ink is the grey furthest from all there are, for whoever tells it least from one of them. */
function grown(inks: readonly Ink[], to: number): Ink[] {
	const all = [...inks];
	for (let index = 1; all.length < to; index++)
		all.push({ name: `Added ${index}`, hex: furthestGrey(all.map(({ hex }) => hex)) });
	return all;
}

function furthestGrey(hexes: readonly string[]): string {
	const distances = inkDistances([...spareGreys, ...hexes]);
	const nearest = (grey: number) => Math.min(...distances[grey].slice(spareGreys.length));
	const numbers = spareGreys.map((_, grey) => grey);
	return spareGreys[numbers.reduce((best, grey) => (nearest(grey) > nearest(best) ? grey : best))];
}

export const usePalette =
	({ id, name, inks }: Palette) =>
	(draft: Draft): Draft => ({
		...draft,
		palette: { id, name, inks: inks.map((ink) => ({ ...ink })) },
	});

/** Other inks in place of the sheet's: once changed by hand the palette is the sheet's own. */
export const withInks =
	(inks: readonly Ink[], how = 'changed') =>
	(draft: Draft): Draft => {
		const { id, name, from } = draft.palette;
		const origin = from ?? (id === 'own' ? undefined : id);
		return {
			...draft,
			palette: {
				id: 'own',
				name: id === 'own' ? name : `${name}, ${how}`.slice(0, 120),
				inks: [...inks],
				...(origin ? { from: origin } : {}),
			},
		};
	};

export const changeInk =
	(number: number, change: Partial<Ink>) =>
	(draft: Draft): Draft =>
		withInks(
			draft.palette.inks.map((ink, index) => (index === number ? { ...ink, ...change } : ink)),
		)(draft);

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
const inOrder = ({ a, b }: Pair): Pair => (a < b ? { a, b } : { a: b, b: a });
const nameOf = (pair: Pair): string => JSON.stringify(Object.values(inOrder(pair)));
const without = <P extends Pair>(list: readonly P[], names: ReadonlySet<string>): P[] =>
	list.filter((pair) => !names.has(nameOf(pair)));

/** Who decides by hand, as far as it is known before the server signs it. */
const signature = (by?: string) => ({
	...(by ? { by } : {}),
	at: new Date().toISOString().slice(0, 10),
});

/** Strikes borders out: these pairs may share an ink. One that was added by hand is simply taken back. */
export const strike =
	(pairs: readonly Pair[], reason: string, by?: string) =>
	(draft: Draft): Draft => {
		const added = new Set(draft.added.map(nameOf));
		const names = new Set(pairs.map(nameOf));
		const known = new Set(draft.struck.map(nameOf));
		const out = pairs
			.filter((pair) => !added.has(nameOf(pair)) && !known.has(nameOf(pair)))
			.map((pair) => ({ ...inOrder(pair), reason, ...signature(by) }));
		return { ...draft, added: without(draft.added, names), struck: [...draft.struck, ...out] };
	};

/** Takes back what was decided by hand about these pairs: struck out or added, they are as found. */
export const takeBack =
	(pairs: readonly Pair[]) =>
	(draft: Draft): Draft => {
		const names = new Set(pairs.map(nameOf));
		return { ...draft, struck: without(draft.struck, names), added: without(draft.added, names) };
	};

/** Adds borders by hand: these pairs must differ though they do not touch, or not enough to count. */
export const addBorders =
	(pairs: readonly Pair[], reason: string, by?: string) =>
	(draft: Draft): Draft => {
		const names = new Set(pairs.map(nameOf));
		const put = pairs.map((pair) => ({ ...inOrder(pair), reason, ...signature(by) }));
		return {
			...draft,
			struck: without(draft.struck, names),
			added: [...without(draft.added, names), ...put],
		};
	};
