/**
 * Units that must end in one territory, closed over all pairs: the block of each unit (blocks numbered by
 * their lowest unit) and the units of each block, ascending. A free unit is a block of its own.
 */
export function blocksOf(
	units: number,
	together: readonly (readonly [number, number])[],
): { block: Int32Array; blocks: number[][] } {
	const parent = Int32Array.from({ length: units }, (_, u) => u);
	const root = (u: number) => {
		while (parent[u] !== u) u = parent[u] = parent[parent[u]];
		return u;
	};
	for (const [a, b] of together) {
		const [p, q] = [root(a), root(b)];
		parent[Math.max(p, q)] = Math.min(p, q);
	}
	const block = new Int32Array(units);
	const blocks: number[][] = [];
	for (let u = 0; u < units; u++) {
		const lowest = root(u);
		block[u] = lowest === u ? blocks.push([]) - 1 : block[lowest];
		blocks[block[u]].push(u);
	}
	return { block, blocks };
}
