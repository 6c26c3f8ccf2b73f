import type { GoalWish } from '$lib/engines/colouring/goal-wish';
import type { EarlierInks } from '$lib/schemas/desk';

/** An edition, or an earlier revision of the draft. */
export type Earlier = NonNullable<GoalWish['against']>;

export const earlierName = (earlier: Earlier): string =>
	'edition' in earlier ? `edition ${earlier.edition}` : `revision ${earlier.revision} of the draft`;

/** Ink of each region by key in an earlier colouring; throws with a plain sentence where there is none. */
export async function readEarlier(
	address: string,
	earlier: Earlier,
	fetcher: typeof fetch = fetch,
): Promise<EarlierInks['inks']> {
	const where = 'edition' in earlier ? `editions/${earlier.edition}` : `drafts/${earlier.revision}`;
	const response = await fetcher(`${address}/${where}/inks`).catch(() => null);
	if (!response) throw new Error('The server cannot be reached.');
	if (response.status === 404) throw new Error(`There is no colouring in ${earlierName(earlier)}.`);
	if (!response.ok) throw new Error(`The inks of ${earlierName(earlier)} could not be read.`);
	return ((await response.json()) as EarlierInks).inks;
}

/** By region number; -1 where a region did not exist then. */
export const inksByRegion = (inks: EarlierInks['inks'], keys: readonly string[]): Int32Array =>
	Int32Array.from(keys, (key) => (Object.hasOwn(inks, key) ? inks[key] : -1));

export interface InkChange {
	region: number;
	before: number;
	after: number;
}

export interface InkComparison {
	/** regions whose ink is another now */
	changes: InkChange[];
	/** regions that were there then too */
	both: number;
	/** regions that did not exist then */
	fresh: number[];
	/** keys of regions that do not exist any more */
	gone: string[];
}

/** What became of the inks of an earlier colouring. Regions are matched by key. */
export function compareInks(
	earlier: EarlierInks['inks'],
	keys: readonly string[],
	now: ArrayLike<number>,
): InkComparison {
	const before = inksByRegion(earlier, keys);
	const there = new Set(keys);
	const changes: InkChange[] = [];
	const fresh: number[] = [];
	for (let region = 0; region < keys.length; region++) {
		if (before[region] < 0) fresh.push(region);
		else if (before[region] !== now[region])
			changes.push({ region, before: before[region], after: now[region] });
	}
	const gone = Object.keys(earlier).filter((key) => !there.has(key));
	return { changes, both: keys.length - fresh.length, fresh, gone };
}
