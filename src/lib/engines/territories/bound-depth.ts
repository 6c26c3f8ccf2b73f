import { mayEndIn, type Prepared } from './prepare.ts';

/** Where the units are that a territory may gain. */
export interface Depths {
	/** units at depth 1, 2, ... from the territory's core; none beyond the most asked */
	rings: number[][];
	/** how many units reached so far, the core included, come from each territory of today (last: none) */
	reached: Map<number, number>;
	/** units of today that may stay, and those tied to the territory */
	core: number[];
	/** some unit certainly ends in it */
	rooted: boolean;
}

/** Units of each territory today; the last list holds those without one. */
export function unitsToday({ problem, units, territories }: Prepared): number[][] {
	const lists: number[][] = Array.from({ length: territories + 1 }, () => []);
	for (let unit = 0; unit < units; unit++) {
		lists[problem.today[unit] < 0 ? territories : problem.today[unit]].push(unit);
	}
	return lists;
}

/**
 * Breadth first from the core of each territory that may gain, over units that may end in it, `most`
 * deep. A unit at depth d in a territory that keeps something of its core implies others of that
 * territory at every depth below d: a path to the core takes one step of depth at a time.
 */
export function depthsOf(prepared: Prepared, today: number[][], most: number): (Depths | null)[] {
	const { fixed, units, territories, stays, open } = prepared;
	const tied: number[][] = Array.from({ length: territories }, () => []);
	for (let unit = 0; unit < units; unit++) if (fixed[unit] >= 0) tied[fixed[unit]].push(unit);
	const seen = new Int32Array(units).fill(-1);
	return today.slice(0, territories).map((list, t) => {
		if (!stays[t] || !open[t]) return null;
		const core = [...new Set([...tied[t], ...list.filter((unit) => mayEndIn(prepared, unit, t))])];
		for (const unit of core) seen[unit] = t;
		const rings: number[][] = [];
		for (let front = core; rings.length < most && front.length > 0;) {
			front = ringAround(prepared, front, t, seen);
			rings.push(front);
		}
		const reached = new Map<number, number>();
		for (const unit of [...core, ...rings.flat()]) {
			const from = prepared.problem.today[unit] < 0 ? territories : prepared.problem.today[unit];
			reached.set(from, (reached.get(from) ?? 0) + 1);
		}
		return { rings, reached, core, rooted: tied[t].length > 0 };
	});
}

function ringAround(prepared: Prepared, front: number[], t: number, seen: Int32Array): number[] {
	const { offsets, targets } = prepared.graph;
	const ring: number[] = [];
	for (const unit of front) {
		for (let i = offsets[unit]; i < offsets[unit + 1]; i++) {
			const other = targets[i];
			if (seen[other] === t || !mayEndIn(prepared, other, t)) continue;
			seen[other] = t;
			ring.push(other);
		}
	}
	return ring;
}
