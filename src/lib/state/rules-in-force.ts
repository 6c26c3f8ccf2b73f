/** Region numbers by key. */
export type RegionNumbers = ReadonlyMap<string, number>;

export const numberRegions = (keys: readonly string[]): RegionNumbers =>
	new Map(keys.map((key, number) => [key, number]));

/** Number of a pair of regions, the same in either order. */
export const pairNumber = (a: number, b: number): number =>
	Math.min(a, b) * 2 ** 26 + Math.max(a, b);

/** Numbers of the pairs that a list of hand-made rules names; pairs of unknown regions are passed over. */
export function pairsNamed(
	pairs: readonly { a: string; b: string }[],
	numbers: RegionNumbers,
): Map<number, string> {
	const named = new Map<number, string>();
	for (const pair of pairs) {
		const [a, b] = [numbers.get(pair.a), numbers.get(pair.b)];
		if (a === undefined || b === undefined) continue;
		named.set(pairNumber(a, b), 'reason' in pair ? String(pair.reason) : '');
	}
	return named;
}
