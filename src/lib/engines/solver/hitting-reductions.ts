/**
 * Makes a hitting set problem smaller without losing a cheapest answer: sets that contain another set
 * are met anyway; an element whose sets are all held by another one that costs no more is never needed;
 * an element alone in a set must be chosen. Repeats until nothing changes.
 * Source: Weihe 1998 (covering trains by stations).
 */
export function reduceSets(
	sets: readonly (readonly number[])[],
	costs: ArrayLike<number>,
): { forced: number[]; rest: number[][] } {
	const forced: number[] = [];
	let rest = sets.map((set) => [...new Set(set)].sort((a, b) => a - b));
	for (;;) {
		rest = withoutSupersets(rest);
		const alone = rest.filter((set) => set.length === 1).map((set) => set[0]);
		if (alone.length > 0) {
			const chosen = new Set(alone);
			forced.push(...chosen);
			rest = rest.filter((set) => !set.some((element) => chosen.has(element)));
			continue;
		}
		const needless = dominated(rest, costs);
		if (needless.size === 0) return { forced, rest };
		rest = rest.map((set) => set.filter((element) => !needless.has(element)));
	}
}

/** For each element the places of the sets that hold it. */
export function holdersOf(sets: readonly (readonly number[])[]): Map<number, number[]> {
	const holders = new Map<number, number[]>();
	sets.forEach((set, place) => {
		for (const element of set) {
			const list = holders.get(element);
			if (list) list.push(place);
			else holders.set(element, [place]);
		}
	});
	return holders;
}

function withoutSupersets(sets: number[][]): number[][] {
	const bySize = [...sets].sort((a, b) => a.length - b.length);
	const kept: number[][] = [];
	const holders = new Map<number, number[]>();
	const met = new Int32Array(sets.length);
	for (const set of bySize) {
		met.fill(0, 0, kept.length);
		const within = set.some((element) =>
			holders.get(element)?.some((place) => ++met[place] === kept[place].length),
		);
		if (within) continue;
		for (const element of set) {
			const list = holders.get(element);
			if (list) list.push(kept.length);
			else holders.set(element, [kept.length]);
		}
		kept.push(set);
	}
	return kept;
}

function dominated(sets: number[][], costs: ArrayLike<number>): Set<number> {
	const holders = holdersOf(sets);
	const needless = new Set<number>();
	for (const [element, places] of holders) {
		const shortest = places.reduce((a, b) => (sets[b].length < sets[a].length ? b : a));
		const better = sets[shortest].some((other) => {
			if (other === element || needless.has(other) || costs[other] > costs[element]) return false;
			const held = holders.get(other) as number[];
			return held.length >= places.length && isSubset(places, held);
		});
		if (better) needless.add(element);
	}
	return needless;
}

/** Both ascending. */
function isSubset(part: number[], whole: number[]): boolean {
	let at = 0;
	for (const value of part) {
		while (at < whole.length && whole[at] < value) at++;
		if (whole[at] !== value) return false;
	}
	return true;
}

/** Sets that share elements, directly or by way of others, belong together. */
export function independentParts(sets: readonly number[][]): number[][][] {
	const holders = holdersOf(sets);
	const seen = new Uint8Array(sets.length);
	const parts: number[][][] = [];
	for (let start = 0; start < sets.length; start++) {
		if (seen[start]) continue;
		seen[start] = 1;
		const places = [start];
		for (let i = 0; i < places.length; i++) {
			for (const element of sets[places[i]]) {
				for (const next of holders.get(element) as number[]) {
					if (seen[next]) continue;
					seen[next] = 1;
					places.push(next);
				}
			}
		}
		parts.push(places.map((place) => sets[place]));
	}
	return parts;
}
