import { ProgramBuilder, type Program } from '../solver/program-builder.ts';
import { depthsOf, unitsToday, type Depths } from './bound-depth.ts';
import type { BoundTerms } from './bound-terms.ts';
import type { Prepared } from './prepare.ts';

/** Moves that every plan makes, as columns. */
interface Draft {
	prepared: Prepared;
	terms: BoundTerms;
	builder: ProgramBuilder;
	depths: (Depths | null)[];
	/** units of each territory today, last: without one */
	today: number[][];
	/** territory -> unit -> column of being gained from within the rings */
	gained: Map<number, number>[];
	/** unit -> its columns of leaving, gained within the rings or deeper */
	leaving: number[][];
	/** unit -> column of going deeper than the rings, -1 for none */
	deep: Int32Array;
	/** territory -> its incoming deep load, one list of columns a measure */
	incoming: number[][][];
	/** territory -> column "has gained from the deep", -1 for none */
	opened: Int32Array;
	/** territory -> column "has left its core entirely", -1 where a unit certainly stays */
	left: Int32Array;
	/** what loads are divided by, one a bound measure */
	scale: number[];
}

/**
 * A program that every plan keeps, so that its least cost is a bound: loads within tolerance after the
 * moves; a unit gained at depth 2 or more needs another one gained at the depth below, and a gained
 * neighbour; from deeper than `most` only load travels, over whole territories of today within the reach
 * rule, and opens a chain of gained units. Left out: that territories stay in one piece otherwise, blocks,
 * pairs apart. `loadRows` names the territory of each row on loads. Costs of moves that are certain are not in it (see boundTerms).
 */
export function boundProgram(
	prepared: Prepared,
	terms: BoundTerms,
	most: number,
): { program: Program; loadRows: Map<number, number> } {
	const { units, territories, bound } = prepared;
	const today = unitsToday(prepared);
	const draft: Draft = {
		prepared,
		terms,
		builder: new ProgramBuilder(),
		today,
		depths: depthsOf(prepared, today, most),
		gained: Array.from({ length: territories }, () => new Map()),
		leaving: Array.from({ length: units }, () => []),
		deep: new Int32Array(units).fill(-1),
		incoming: Array.from({ length: territories }, () => bound.map(() => [])),
		opened: new Int32Array(territories).fill(-1),
		left: new Int32Array(territories).fill(-1),
		scale: bound.map((_, m) => meanTarget(prepared, m)),
	};
	gainedColumns(draft);
	deepColumns(draft);
	unitRows(draft);
	const rows = loadRows(draft);
	for (let t = 0; t < territories; t++) chainRows(draft, t);
	return { program: draft.builder.build(), loadRows: rows };
}

function meanTarget({ targets, territories, stays }: Prepared, m: number): number {
	let sum = 0;
	for (let t = 0; t < territories; t++) sum += targets[m * territories + t];
	return sum / stays.reduce((count, one) => count + one, 0);
}

const costOf = ({ prepared, terms }: Draft, unit: number) =>
	terms.certain[unit] ? 0 : prepared.cost[unit];

function gainedColumns(draft: Draft): void {
	const { prepared, depths, builder, gained, leaving } = draft;
	depths.forEach((depth, t) => {
		if (!depth) return;
		const strangers = depth.core.filter((unit) => prepared.problem.today[unit] !== t);
		for (const unit of [...strangers, ...depth.rings.flat()]) {
			const column = builder.whole(costOf(draft, unit));
			gained[t].set(unit, column);
			leaving[unit].push(column);
		}
	});
}

/** Whether territory `t` may gain units of today's `from` (the last: without territory) at all. */
function within({ steps, territories, problem }: Prepared, from: number, t: number): boolean {
	if (from === t) return false;
	if (!steps || from === territories) return true;
	return steps[from * territories + t] <= (problem.reach ?? Infinity);
}

function deepColumns(draft: Draft): void {
	const { prepared, depths, today, builder, deep, leaving, incoming, scale } = draft;
	const { territories, bound, loads, units, fixed, greatest } = prepared;
	// without a rule all deep load goes through one pool, with one through a pool for each territory
	const sources = prepared.steps ? today : [today.flat()];
	sources.forEach((list, from) => {
		const aims = depths.flatMap((depth, t) => {
			if (!depth || (prepared.steps && !within(prepared, from, t))) return [];
			const inside = prepared.steps
				? (depth.reached.get(from) ?? 0)
				: depth.core.length + depth.rings.flat().length;
			return inside < list.length ? [t] : [];
		});
		const free = list.filter((unit) => fixed[unit] < 0);
		if (aims.length === 0 || free.length === 0) return;
		for (const unit of free) {
			deep[unit] = builder.whole(costOf(draft, unit));
			leaving[unit].push(deep[unit]);
		}
		bound.forEach((_, m) => {
			const arrivals = aims.map((t) => {
				const room = greatest[m * territories + t] / scale[m];
				const column = builder.real(0, 0, Number.isFinite(room) ? room : 1e6);
				incoming[t][m].push(column);
				return column;
			});
			const departing = free.map((unit) => loads[m * units + unit] / scale[m]);
			builder.row(
				0,
				0,
				[...free.map((unit) => deep[unit]), ...arrivals],
				[...departing, ...arrivals.map(() => -1)],
			);
		});
		for (const t of aims) if (draft.opened[t] < 0) draft.opened[t] = builder.whole(0);
	});
}

function unitRows({ prepared, terms, builder, leaving }: Draft): void {
	for (let unit = 0; unit < prepared.units; unit++) {
		if (leaving[unit].length === 0 && !terms.certain[unit]) continue;
		builder.row(terms.certain[unit] ? 1 : 0, 1, leaving[unit]);
	}
}

const WIDER = 1e-7;

/** Rows on the load of each territory; answers which row is whose. */
function loadRows(draft: Draft): Map<number, number> {
	const rows = new Map<number, number>();
	const { prepared, builder, gained, leaving, incoming, scale, today } = draft;
	const { territories, bound, loads, units, least, greatest, targets, stays } = prepared;
	for (let t = 0; t < territories; t++) {
		if (!stays[t]) continue;
		bound.forEach((_, m) => {
			const target = targets[m * territories + t];
			const share = (unit: number) => loads[m * units + unit] / target;
			const columns: number[] = [];
			const signs: number[] = [];
			let held = 0;
			for (const unit of today[t]) {
				held += share(unit);
				for (const column of leaving[unit]) {
					columns.push(column);
					signs.push(-share(unit));
				}
			}
			for (const [unit, column] of gained[t]) {
				columns.push(column);
				signs.push(share(unit));
			}
			for (const column of incoming[t][m]) {
				columns.push(column);
				signs.push(scale[m] / target);
			}
			const low = least[m * territories + t] / target - held - WIDER;
			const high = greatest[m * territories + t] / target - held + WIDER;
			rows.set(builder.row(low, high, columns, signs), t);
		});
	}
	return rows;
}

function chainRows(draft: Draft, t: number): void {
	const { prepared, builder, depths, gained, opened, incoming, left, leaving, scale } = draft;
	const depth = depths[t];
	if (!depth || depth.core.length === 0) return;
	const free: number[] = [];
	if (!depth.rooted) {
		left[t] = builder.real(0, 0, 1);
		free.push(left[t]);
		const gone = depth.core.flatMap((unit) => leaving[unit]);
		builder.row(0, Infinity, [...gone, left[t]], [...gone.map(() => 1), -depth.core.length]);
	}
	const need = (column: number, some: number[]) => {
		const all = [...some, ...free];
		builder.row(0, Infinity, [column, ...all], [-1, ...all.map(() => 1)]);
	};
	const ringColumns = depth.rings.map((ring) => ring.map((unit) => gained[t].get(unit)!));
	if (opened[t] >= 0) {
		for (const ring of ringColumns) need(opened[t], ring);
		incoming[t].forEach((columns, m) => {
			const room = prepared.greatest[m * prepared.territories + t] / scale[m];
			if (columns.length === 0 || !Number.isFinite(room)) return;
			builder.row(0, Infinity, [opened[t], ...columns], [room, ...columns.map(() => -1)]);
		});
	}
	depth.rings.forEach((ring, at) => {
		if (at === 0) return;
		for (const unit of ring) {
			const column = gained[t].get(unit)!;
			need(column, ringColumns[at - 1]);
			const near = neighboursIn(prepared, gained[t], unit);
			need(column, opened[t] >= 0 ? [...near, opened[t]] : near);
		}
	});
}

function neighboursIn({ graph }: Prepared, columns: Map<number, number>, unit: number): number[] {
	const near: number[] = [];
	for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
		const column = columns.get(graph.targets[i]);
		if (column !== undefined) near.push(column);
	}
	return near;
}
