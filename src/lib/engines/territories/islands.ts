import { blockMayEndIn, fixedUnits } from './block-rules.ts';
import { shareOut, type Sharing } from './island-shares.ts';
import { partsOf } from './parts-of.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible, Relief } from './problem.ts';
import { amount, counted, listedTerritories, percentUp } from './words.ts';

/**
 * A part of the map, cut off by water or by frozen territories, that the open territories cannot share:
 * nobody can live there, more are tied to it than it has units, its load suits no choice of the
 * territories that can live there, or there are more such parts than territories to serve them.
 * Null when there is none.
 *
 * Every territory lives in one part: that of its base and fixed units, or any where it may take a unit.
 */
export function islandLoad(prepared: Prepared): Impossible | null {
	const islands = islandsOf(prepared);
	for (const island of islands) {
		const fault = crowded(island) ?? unshared(prepared, island);
		if (fault) return fault;
	}
	return tooMany(prepared, islands);
}

interface Island {
	units: number[];
	/** territories with a fixed unit here */
	settled: number[];
	/** territories without a fixed unit anywhere that may take a unit here */
	guests: number[];
}

function islandsOf(prepared: Prepared): Island[] {
	const { graph, fixed, open, territories, problem } = prepared;
	const frozen = (u: number) => fixed[u] >= 0 && problem.territories[fixed[u]].frozen;
	const parts = partsOf(
		graph,
		fixed.map((_, u) => (frozen(u) ? 1 : 0)),
	);
	const anchored = fixedUnits(prepared);
	const settled: number[][] = parts.units.map(() => []);
	const floating: number[] = [];
	for (let t = 0; t < territories; t++) {
		if (!open[t]) continue;
		if (anchored[t].length === 0) floating.push(t);
		else settled[parts.of[anchored[t][0]]].push(t);
	}
	return parts.units.flatMap((units, part) => {
		if (parts.territory[part] === 1) return [];
		const guests = floating.filter((t) => units.some((u) => blockMayEndIn(prepared, u, t)));
		return [{ units, settled: settled[part], guests }];
	});
}

function crowded({ units, settled }: Island): Impossible | null {
	if (settled.length <= units.length) return null;
	const told = `${counted(settled.length, 'territory is', 'territories are')} tied to`;
	return fault(`${told} ${part(units)}.`, units, settled, []);
}

function unshared(prepared: Prepared, { units, settled, guests }: Island): Impossible | null {
	const { bound, problem, loads, units: count } = prepared;
	if (settled.length + guests.length === 0) {
		return fault(`No territory can take ${part(units)}.`, units, [], []);
	}
	const load = bound.map((_, row) => units.reduce((sum, u) => sum + loads[row * count + u], 0));
	const sharing: Sharing = { prepared, load, settled, guests, most: units.length };
	const shares = shareOut(sharing);
	if (shares.possible) return null;
	const relief: Relief[] = shares.eased.flatMap((value, row) =>
		value < Infinity ? [{ kind: 'tolerance' as const, measure: bound[row], value }] : [],
	);
	const loadsTold = bound.map((m, row) => `${amount(load[row])} of ${problem.measures[m].name}`);
	const who =
		guests.length === 0
			? `whose ${counted(settled.length, 'territory is', 'territories are')} ${listedTerritories(settled)}`
			: `where ${settled.length} to ${settled.length + guests.length} territories can live`;
	const would = relief.flatMap((r) =>
		r.kind === 'tolerance'
			? [`a tolerance of ${percentUp(r.value)} for ${problem.measures[r.measure].name} would do`]
			: [],
	);
	const message = `No number of targets within tolerance makes up the ${loadsTold.join(' and ')} of ${part(units)}, ${who}`;
	return fault([message, ...would].join('; ') + '.', units, settled, relief);
}

/** One unit of every part that has nobody, where these are more than the territories that can move in. */
function tooMany({ open, fixed }: Prepared, islands: Island[]): Impossible | null {
	const tied = new Set(fixed);
	const floating = open.filter((yes, t) => yes === 1 && !tied.has(t)).length;
	const empty = islands.filter(({ settled }) => settled.length === 0);
	if (empty.length <= floating) return null;
	const units = empty.flatMap((island) => island.units);
	const parts = counted(empty.length, 'part of the map has', 'parts of the map have');
	const free = counted(floating, 'territory is free', 'territories are free');
	return fault(`${parts} no territory, and only ${free} to move there.`, units, [], []);
}

const part = (units: number[]) =>
	units.length === 1 ? `#${units[0]}` : `the part of ${units.length} units around #${units[0]}`;

function fault(
	message: string,
	units: number[],
	territories: number[],
	relief: Relief[],
): Impossible {
	return {
		status: 'impossible',
		reason: 'island-load',
		message,
		witness: { units, territories },
		relief,
	};
}
