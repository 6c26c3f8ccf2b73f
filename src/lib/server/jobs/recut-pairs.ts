import { compareBorders, type BorderList } from '../../engines/borders/index.ts';
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
	const { gained, lost, changed } = compareBorders(
		{ keys: carriedKeys(match), borders: before },
		{ keys: match.after.keys, borders: after },
	);
	const counts = { gained: gained.length, lost: lost.length, changed: changed.length };
	return {
		gained: gained.slice(0, mostListed).map(({ a, b, at, kind, metres }) => ({
			...{ a, b, before: null, after: { kind, metres }, at: placeOf(at) },
		})),
		lost: lost.slice(0, mostListed).map(({ a, b, at, kind, metres }) => ({
			...{ a, b, before: { kind, metres }, after: null, at: placeOf(at) },
		})),
		changed: changed.slice(0, mostListed).map((pair) => ({ ...pair, at: placeOf(pair.at) })),
		counts,
	};
}

const placeOf = (at: [number, number]): PairChange['at'] => (at.every(Number.isFinite) ? at : null);

/** The key that each old region has now, where it goes on as one that no other old region is called by. */
function carriedKeys({ before, after, groups }: RegionMatch): string[] {
	const keys = [...before.keys];
	const asOne = groups.filter((group) => group.before.length === 1 && group.after.length === 1);
	const moved = new Set(asOne.map((group) => group.before[0]));
	const staying = new Set(keys.filter((_, region) => !moved.has(region)));
	for (const group of asOne) {
		const key = after.keys[group.after[0]];
		if (!staying.has(key)) keys[group.before[0]] = key;
	}
	return keys;
}
