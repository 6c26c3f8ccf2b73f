import type { RegionGraph } from '../graph/region-graph.ts';
import { inducedSubgraph } from '../graph/subgraph.ts';
import { FreeInks, newBoard, setInk, mayTake, type Board } from './board.ts';
import { listColouring } from './list-colouring.ts';
import type { Prepared } from './prepare.ts';

export interface WholeOptions {
	conflicts: number;
	/** vertices times inks that are still put to the solver */
	size: number;
	/** vertices of a clique: their inks are fixed beforehand where no rule tells inks apart */
	clique: number[];
	cancelled?: () => boolean;
}

/**
 * Decides by satisfiability whether the whole map can be coloured with so many inks. Vertices with more
 * inks to choose from than neighbours left are set aside first, one after the other, and inked last.
 */
export function wholeColouring(
	prepared: Prepared,
	inks: number,
	options: WholeOptions,
): Int32Array | 'unsat' | 'unknown' {
	if (prepared.inksLocked > inks) return 'unsat';
	const { graph, fixed, bans } = prepared;
	const board = newBoard(graph, inks, fixed, bans);
	const { core, aside } = peel(board);
	if (core.length * inks > options.size) return 'unknown';
	const preset = presetOf(board, options.clique);
	const part = inducedSubgraph(graph, core);
	const solved = listColouring(part, listsOf(board, core, preset), options);
	if (typeof solved === 'string') return solved;
	core.forEach((v, i) => setInk(board, v, solved[i]));
	const free = new FreeInks(board);
	for (let i = aside.length - 1; i >= 0; i--) setInk(board, aside[i], free.leastUsed(aside[i]));
	return board.ink;
}

/** Inks of a clique in order, where all inks are alike. */
function presetOf({ fixed, bans, inks }: Board, clique: number[]): Map<number, number> {
	if (fixed || bans) return new Map();
	return new Map(clique.slice(0, inks).map((v, ink) => [v, ink]));
}

function listsOf(board: Board, core: number[], preset: Map<number, number>) {
	const held = core.map((v) => lockedAround(board, v));
	return {
		inks: board.inks,
		allowed: (i: number, ink: number) => {
			const set = preset.get(core[i]);
			if (set !== undefined && set !== ink) return false;
			return !held[i].has(ink) && mayTake(board, core[i], ink);
		},
		hint: () => -1,
	};
}

function lockedAround({ graph, ink }: Board, v: number): Set<number> {
	const held = new Set<number>();
	for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
		if (ink[graph.targets[e]] >= 0) held.add(ink[graph.targets[e]]);
	}
	return held;
}

/** Free vertices that always find an ink (`aside`, in the order taken), and the others. */
export function peel(board: Board): { core: number[]; aside: number[] } {
	const { graph, ink } = board;
	const slack = new Int32Array(graph.count);
	const state = new Uint8Array(graph.count);
	const aside: number[] = [];
	for (let v = 0; v < graph.count; v++) {
		if (ink[v] >= 0) continue;
		slack[v] = slackOf(board, v);
		if (slack[v] <= 0) continue;
		state[v] = 1;
		aside.push(v);
	}
	for (let head = 0; head < aside.length; head++) relax(graph, aside[head]);
	function relax({ offsets, targets }: RegionGraph, v: number): void {
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const w = targets[e];
			if (state[w] || ink[w] >= 0 || ++slack[w] <= 0) continue;
			state[w] = 1;
			aside.push(w);
		}
	}
	const core: number[] = [];
	for (let v = 0; v < graph.count; v++) if (ink[v] < 0 && !state[v]) core.push(v);
	return { core, aside };
}

/** Inks the vertex may have beside locked neighbours, less its free neighbours. */
function slackOf(board: Board, v: number): number {
	const { graph, ink, inks } = board;
	const held = new Set<number>();
	let free = 0;
	for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
		const c = ink[graph.targets[e]];
		if (c >= 0) held.add(c);
		else free++;
	}
	let choices = 0;
	for (let c = 0; c < inks; c++) if (!held.has(c) && mayTake(board, v, c)) choices++;
	return choices - free;
}
