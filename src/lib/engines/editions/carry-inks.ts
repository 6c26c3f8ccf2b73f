import { heirsOf, type RegionMatch } from '../boundaries/recut/index.ts';

/**
 * The colouring before a re-cut as wishes for the new regions: what the colouring engine takes as
 * `previous`, so that as few regions as can be change their ink.
 *
 * In: ink of each old region, -1 for none; the match. Out: ink of each new region, -1 where it goes on
 * from none that had one; where several had different inks, the ink with most of the new region's ground
 * (of equal shares, that of the first old region). Pieces of one region wish for the same ink, so the
 * wishes need not be a proper colouring. Throws RangeError for a list of another length.
 */
export function carryInks(inks: ArrayLike<number>, match: RegionMatch): Int32Array {
	if (inks.length !== match.before.keys.length) {
		throw new RangeError('The inks are of other regions than the match.');
	}
	const { was, shareOfNew } = heirsOf(match);
	return Int32Array.from(was, (olds, fresh) => {
		const shares = new Map<number, number>();
		for (const old of olds) {
			if (inks[old] < 0) continue;
			shares.set(inks[old], (shares.get(inks[old]) ?? 0) + shareOfNew(old, fresh));
		}
		let [best, most] = [-1, -1];
		for (const [ink, share] of shares) if (share > most) [best, most] = [ink, share];
		return best;
	});
}
