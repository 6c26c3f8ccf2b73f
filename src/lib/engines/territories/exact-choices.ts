import { mayEndIn, type Prepared } from './prepare.ts';

/** Where each block may end, after everything that can be told without a search. */
export interface Choices {
	/** block -> territories, ascending, at least one */
	of: number[][];
	/** territory -> units that may end in it */
	pool: number[][];
	/** unit that certainly ends in the territory and roots its contiguity, -1 for none */
	root: Int32Array;
}

/** A block that can end nowhere, or a territory that cannot be filled or hold together. */
export interface DeadEnd {
	dead: 'block' | 'territory';
	block: number;
	territory: number;
}

export type MayEnd = (unit: number, territory: number) => boolean;

/**
 * Where each block may end: rules on single units, its weight, fixed units it must be apart from, and
 * whether it can be joined to its territory at all. Pools too light or cut off from the root are
 * dropped, again and again until nothing changes. What is dropped is in no plan that keeps the rules.
 *
 * `may` narrows the rules (a search in a few territories); `judged` says which territories must come
 * right (absent: all that stay).
 */
export function choicesOf(
	prepared: Prepared,
	may: MayEnd = (unit, territory) => mayEndIn(prepared, unit, territory),
	judged: (territory: number) => boolean = (territory) => prepared.stays[territory] === 1,
): Choices | DeadEnd {
	const of = prepared.blocks.map((block) => allowed(prepared, block, may, judged));
	for (;;) {
		const none = of.findIndex((list) => list.length === 0);
		if (none >= 0) return { dead: 'block', block: none, territory: -1 };
		const pool = poolsOf(prepared, of);
		const root = rootsOf(prepared, of);
		let dropped = false;
		for (let t = 0; t < prepared.territories; t++) {
			if (!judged(t)) continue;
			const kept = joinable(prepared, t, pool[t], root[t]);
			if (kept.size === pool[t].length && kept.size > 0 && fillable(prepared, t, pool[t])) continue;
			const fixedOut = pool[t].some((u) => !kept.has(u) && of[prepared.block[u]].length === 1);
			if (fixedOut || kept.size === 0 || !fillable(prepared, t, [...kept])) {
				return { dead: 'territory', block: -1, territory: t };
			}
			for (const unit of pool[t]) {
				if (kept.has(unit)) continue;
				const block = prepared.block[unit];
				of[block] = of[block].filter((other) => other !== t);
				dropped = true;
			}
		}
		if (!dropped) return crowded(prepared, of, judged) ?? { of, pool, root };
	}
}

function allowed(
	prepared: Prepared,
	block: number[],
	may: MayEnd,
	judged: (territory: number) => boolean,
): number[] {
	const { territories, fixed, apart, block: blockOf } = prepared;
	const split = block.some((u) =>
		(apart.get(u) ?? []).some((other) => blockOf[other] === blockOf[u]),
	);
	const list: number[] = [];
	for (let t = 0; !split && t < territories; t++) {
		if (!block.every((u) => may(u, t))) continue;
		if (block.some((u) => (apart.get(u) ?? []).some((other) => fixed[other] === t))) continue;
		if (!judged(t) || fits(prepared, t, block)) list.push(t);
	}
	return list;
}

/** loads summed in another order differ in the last bits */
const ROUNDING = 1e-12;

export function fits(prepared: Prepared, t: number, units: Iterable<number>): boolean {
	const { greatest, territories } = prepared;
	return loadsOf(prepared, units).every(
		(load, m) => load <= greatest[m * territories + t] * (1 + ROUNDING),
	);
}

/** Whether these units weigh enough for the territory in every bound measure. */
export function fillable(prepared: Prepared, t: number, units: Iterable<number>): boolean {
	const { least, territories } = prepared;
	return loadsOf(prepared, units).every(
		(load, m) => load >= least[m * territories + t] * (1 - ROUNDING),
	);
}

/** Load of `units` in every bound measure. */
export function loadsOf({ bound, loads, units: count }: Prepared, units: Iterable<number>) {
	const sums = bound.map(() => 0);
	for (const unit of units) {
		for (let m = 0; m < sums.length; m++) sums[m] += loads[m * count + unit];
	}
	return sums;
}

function poolsOf({ territories, blocks }: Prepared, of: number[][]): number[][] {
	const pool: number[][] = Array.from({ length: territories }, () => []);
	of.forEach((list, block) => {
		for (const t of list) pool[t].push(...blocks[block]);
	});
	return pool;
}

function rootsOf({ problem, territories, blocks, block }: Prepared, of: number[][]): Int32Array {
	const root = new Int32Array(territories).fill(-1);
	of.forEach((list, b) => {
		if (list.length === 1 && root[list[0]] < 0) root[list[0]] = blocks[b][0];
	});
	problem.territories.forEach(({ base, closing }, t) => {
		if (base >= 0 && !closing && of[block[base]].includes(t)) root[t] = base;
	});
	return root;
}

/** Units of the pool that can be in one piece with the root, or in a piece heavy enough by itself. */
function joinable(prepared: Prepared, t: number, pool: number[], root: number): Set<number> {
	const kept = new Set<number>();
	for (const piece of piecesOf(prepared, pool)) {
		const good = root >= 0 ? piece.includes(root) : fillable(prepared, t, piece);
		if (good) for (const unit of piece) kept.add(unit);
	}
	return kept;
}

/** The connected pieces of a set of units. */
export function piecesOf({ graph }: Prepared, units: Iterable<number>): number[][] {
	const open = new Set(units);
	const pieces: number[][] = [];
	for (const start of open) {
		const piece = [start];
		open.delete(start);
		for (const unit of piece) {
			for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
				if (open.delete(graph.targets[i])) piece.push(graph.targets[i]);
			}
		}
		pieces.push(piece);
	}
	return pieces;
}

/** A territory whose certain units weigh too much already, or must be apart. */
function crowded(
	prepared: Prepared,
	of: number[][],
	judged: (territory: number) => boolean,
): DeadEnd | null {
	const certain: number[][] = Array.from({ length: prepared.territories }, () => []);
	of.forEach((list, block) => {
		if (list.length === 1) certain[list[0]].push(...prepared.blocks[block]);
	});
	const clash = (units: number[]) => {
		const own = new Set(units);
		return units.some((u) => (prepared.apart.get(u) ?? []).some((other) => own.has(other)));
	};
	const t = certain.findIndex(
		(units, t) => judged(t) && (!fits(prepared, t, units) || clash(units)),
	);
	return t < 0 ? null : { dead: 'territory', block: -1, territory: t };
}
