/**
 * Territory grown from seeds over a graph: every place goes to the seed it is reached from most
 * cheaply. Returns the number of the seed for each place, -1 where none reaches.
 */
export function grow(
	neighbours: readonly (readonly number[])[],
	seeds: readonly number[],
	cost: (from: number, to: number) => number,
	headStart: readonly number[] = [],
): Int32Array {
	const owner = new Int32Array(neighbours.length).fill(-1);
	const reach = new Float64Array(neighbours.length).fill(Infinity);
	seeds.forEach((place, seed) => {
		owner[place] = seed;
		reach[place] = headStart[seed] ?? 0;
	});
	let front = [...seeds];
	while (front.length > 0) {
		const next = new Set<number>();
		for (const from of front) {
			for (const to of neighbours[from]) {
				const there = reach[from] + cost(from, to);
				if (there >= reach[to]) continue;
				reach[to] = there;
				owner[to] = owner[from];
				next.add(to);
			}
		}
		front = [...next].sort((a, b) => reach[a] - reach[b]);
	}
	return settle(neighbours, seeds, reach, owner, cost);
}

/** Owners once more in order of reach, so that every territory hangs together. */
function settle(
	neighbours: readonly (readonly number[])[],
	seeds: readonly number[],
	reach: Float64Array,
	owner: Int32Array,
	cost: (from: number, to: number) => number,
): Int32Array {
	const isSeed = new Set(seeds);
	const order = [...reach.keys()].filter((place) => reach[place] < Infinity);
	order.sort((a, b) => reach[a] - reach[b]);
	for (const place of order) {
		if (isSeed.has(place)) continue;
		let best = -1;
		for (const from of neighbours[place]) {
			if (reach[from] >= reach[place]) continue;
			if (best < 0 || reach[from] + cost(from, place) < reach[best] + cost(best, place))
				best = from;
		}
		if (best >= 0) owner[place] = owner[best];
	}
	return owner;
}
