import { borderKinds, type BorderKind, type BorderList } from './border-list.ts';

export interface KeyedBorders {
	keys: string[];
	borders: BorderList;
}

/** One pair of regions by key, `a` before `b`, as it was or is. */
export interface PairEntry {
	a: string;
	b: string;
	kind: BorderKind;
	metres: number;
	/** a place on the border, longitude and latitude */
	at: [number, number];
}

export interface PairChange {
	a: string;
	b: string;
	before: { kind: BorderKind; metres: number };
	after: { kind: BorderKind; metres: number };
	at: [number, number];
}

export interface BorderChanges {
	gained: PairEntry[];
	lost: PairEntry[];
	/** pairs of another kind, or whose metres differ by more than half a percent of the longer */
	changed: PairChange[];
}

const share = 0.005;

/**
 * What becomes of the borders between two readings, pair by pair. Regions are taken for the same by
 * their keys; the lists are sorted by key (code units), whatever the numbers of the regions.
 */
export function compareBorders(before: KeyedBorders, after: KeyedBorders): BorderChanges {
	const [was, is] = [entriesOf(before), entriesOf(after)];
	const changes: BorderChanges = { gained: [], lost: [], changed: [] };
	for (const [pair, entry] of is) {
		const old = was.get(pair);
		if (!old) changes.gained.push(entry);
		else if (differs(old, entry)) {
			const { a, b, at } = entry;
			changes.changed.push({ a, b, at, before: measureOf(old), after: measureOf(entry) });
		}
	}
	for (const [pair, entry] of was) if (!is.has(pair)) changes.lost.push(entry);
	changes.gained.sort(byKeys);
	changes.lost.sort(byKeys);
	changes.changed.sort(byKeys);
	return changes;
}

function entriesOf({ keys, borders }: KeyedBorders): Map<string, PairEntry> {
	const entries = new Map<string, PairEntry>();
	for (let i = 0; i < borders.a.length; i++) {
		const [p, q] = [keys[borders.a[i]], keys[borders.b[i]]];
		const [a, b] = p < q ? [p, q] : [q, p];
		entries.set(JSON.stringify([a, b]), {
			...{ a, b },
			kind: borderKinds[borders.kind[i]],
			metres: borders.metres[i],
			at: [borders.at[2 * i], borders.at[2 * i + 1]],
		});
	}
	return entries;
}

const differs = (p: PairEntry, q: PairEntry) =>
	p.kind !== q.kind || Math.abs(p.metres - q.metres) > share * Math.max(p.metres, q.metres);

const measureOf = ({ kind, metres }: PairEntry) => ({ kind, metres });

const byKeys = (p: { a: string; b: string }, q: { a: string; b: string }) =>
	compare(p.a, q.a) || compare(p.b, q.b);

const compare = (p: string, q: string) => Number(p > q) - Number(p < q);
