/**
 * The group each region belongs to when all `alike` pairs share an ink, named by its lowest region;
 * null when nothing is to be kept alike. Union by lowest root with path halving.
 */
export function alikeGroups(
	regions: number,
	alike: readonly (readonly [number, number])[] | undefined,
): Uint32Array | null {
	if (!alike || alike.length === 0) return null;
	const parent = new Uint32Array(regions);
	for (let r = 0; r < regions; r++) parent[r] = r;
	const find = (r: number) => {
		while (parent[r] !== r) r = parent[r] = parent[parent[r]];
		return r;
	};
	for (const [a, b] of alike) {
		const low = Math.min(find(a), find(b));
		const high = Math.max(find(a), find(b));
		parent[high] = low;
	}
	for (let r = 0; r < regions; r++) parent[r] = find(r);
	return parent;
}
