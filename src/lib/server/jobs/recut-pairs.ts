import { borderKinds, type BorderList } from '../../engines/borders/index.ts';
import type { RegionMatch } from '../../engines/boundaries/recut/index.ts';
import { mostListed, type PairChange, type RecutChange } from '../../schemas/recut.ts';

/**
 * Borders before and after a re-cut. A region that goes on as one under another key is taken for the same
 * region, so that a file with new keys does not lose every border and gain them all.
 */
export function pairChanges(
	match: RegionMatch,
	before: BorderList,
	after: BorderList,
): RecutChange['pairs'] {
	const keys = match.after.keys;
	const was = new Map(pairsOf(before, carriedKeys(match)));
	const changes = { gained: listing(), lost: listing(), changed: listing() };
	for (const [pair, now] of pairsOf(after, keys)) {
		const old = was.get(pair);
		was.delete(pair);
		if (!old) changes.gained.add({ ...now.keys, before: null, after: now.border, at: now.at });
		else if (differs(old.border, now.border)) {
			changes.changed.add({ ...now.keys, before: old.border, after: now.border, at: now.at });
		}
	}
	for (const old of was.values()) {
		changes.lost.add({ ...old.keys, before: old.border, after: null, at: old.at });
	}
	const { gained, lost, changed } = changes;
	return {
		...{ gained: gained.list, lost: lost.list, changed: changed.list },
		counts: { gained: gained.count(), lost: lost.count(), changed: changed.count() },
	};
}

/** A list that is cut, and counts on. */
function listing() {
	const list: PairChange[] = [];
	let count = 0;
	const add = (change: PairChange) => void (count++ < mostListed && list.push(change));
	return { list, add, count: () => count };
}

/** The key that each old region has now, where it goes on as one; else its own. */
function carriedKeys({ before, after, groups }: RegionMatch): string[] {
	const keys = [...before.keys];
	for (const group of groups) {
		if (group.before.length === 1 && group.after.length === 1) {
			keys[group.before[0]] = after.keys[group.after[0]];
		}
	}
	return keys;
}

type Border = NonNullable<PairChange['before']>;
interface Pair {
	keys: { a: string; b: string };
	border: Border;
	at: [number, number] | null;
}

function* pairsOf(borders: BorderList, keys: string[]): Generator<[string, Pair]> {
	for (let i = 0; i < borders.a.length; i++) {
		const [a, b] = [keys[borders.a[i]], keys[borders.b[i]]].sort();
		const [lon, lat] = [borders.at[2 * i], borders.at[2 * i + 1]];
		const border = { kind: borderKinds[borders.kind[i]], metres: borders.metres[i] };
		const at: Pair['at'] = Number.isFinite(lon) && Number.isFinite(lat) ? [lon, lat] : null;
		yield [`${a}\n${b}`, { keys: { a, b }, border, at }];
	}
}

/** Another kind, or longer or shorter by more than a hundredth and a metre: our choice, no source. */
const differs = (was: Border, now: Border): boolean =>
	was.kind !== now.kind ||
	Math.abs(was.metres - now.metres) > Math.max(1, 0.01 * Math.max(was.metres, now.metres));
