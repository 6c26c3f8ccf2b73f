import { mayTake, newBoard, type Board } from './board.ts';
import type { Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

/** What the earlier colouring wishes of each vertex. */
export interface Wishes {
	/** the ink most regions of the vertex had and may still have, -1 for none */
	old: Int32Array;
	/** regions of the vertex that had an ink it may still have, as [ink, regions] */
	kept: ReadonlyMap<number, number>[] | null;
	/** regions whose earlier ink is not possible any more */
	compulsory: number;
}

/** Reads the earlier inks by vertex; single regions, the usual case, need no lists. */
export function wishesOf(problem: ColouringProblem, prepared: Prepared, inks: number): Wishes {
	const previous = problem.previous ?? new Int32Array(problem.regions).fill(-1);
	const board = newBoard(prepared.graph, inks, prepared.fixed, prepared.bans);
	const old = new Int32Array(prepared.graph.count).fill(-1);
	const kept = prepared.grouped
		? Array.from({ length: old.length }, () => new Map<number, number>())
		: null;
	let compulsory = 0;
	for (let r = 0; r < problem.regions; r++) {
		const v = prepared.vertexOf[r];
		const ink = previous[r];
		if (ink < 0) continue;
		if (ink >= inks || !mayTake(board, v, ink)) compulsory++;
		else if (kept) kept[v].set(ink, (kept[v].get(ink) ?? 0) + 1);
		else old[v] = ink;
	}
	kept?.forEach((counts, v) => {
		for (const [ink, count] of counts) {
			if (old[v] < 0 || count > (counts.get(old[v]) as number)) old[v] = ink;
		}
	});
	return { old, kept, compulsory };
}

/** Regions of vertex v that keep their ink when it has `ink`, for every ink where that is any. */
export function keptAt({ old, kept }: Wishes, v: number): Iterable<readonly [number, number]> {
	if (kept) return kept[v];
	return old[v] < 0 ? [] : [[old[v], 1]];
}

/** The old inks, locked vertices at their locks; not proper where borders changed. */
export function oldBoard({ old }: Wishes, { fixed }: Board): Int32Array {
	return old.map((ink, v) => (fixed && fixed[v] >= 0 ? fixed[v] : ink));
}

/** Regions of vertex v that change whatever its ink: those outvoted within their keep-alike group. */
export function outvotedAt(wishes: Wishes, v: number): number {
	let all = 0;
	let most = 0;
	for (const [, regions] of keptAt(wishes, v)) {
		all += regions;
		most = Math.max(most, regions);
	}
	return all - most;
}
