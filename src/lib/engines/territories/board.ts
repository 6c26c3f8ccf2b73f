import { figureContext, membersOf, type FigureContext } from './figure-context.ts';
import type { PlanFigures, TerritoryFigures, UnitShare } from './figures-of.ts';
import type { TerritoryProblem } from './problem.ts';
import { territoryFigures } from './territory-figures.ts';
import type { UnitGeometry } from './unit-geometry.ts';
import { largestUnits, newTally, tallyUp, wholeFigures, type Tally } from './whole-figures.ts';

/**
 * An assignment with live figures. A move touches two territories; their figures are worked out anew from
 * their own units when next asked for, so nothing drifts however many moves are made. Undoing is moving
 * back.
 */
export class Board {
	readonly assignment: Int32Array;
	private readonly context: FigureContext;
	private readonly members: number[][];
	private readonly known: (TerritoryFigures | null)[];
	private readonly tally: Tally;
	private readonly heaviest: (UnitShare | null)[];

	/**
	 * @param assignment territory of each unit, -1 for none; copied
	 * @param geometry null where unknown: then there is no travel and no shape
	 * @throws RangeError when lengths differ or a territory is out of range
	 */
	constructor(problem: TerritoryProblem, assignment: Int32Array, geometry: UnitGeometry | null) {
		const k = problem.territories.length;
		if (assignment.length !== problem.graph.count) {
			throw new RangeError(`${assignment.length} entries for ${problem.graph.count} units.`);
		}
		const wrong = assignment.findIndex((t) => t < -1 || t >= k);
		if (wrong >= 0) throw new RangeError(`Unit ${wrong} is in no territory of the problem.`);
		this.assignment = assignment.slice();
		this.context = figureContext(problem, geometry);
		this.members = membersOf(assignment, k);
		this.known = Array.from({ length: k }, () => null);
		this.tally = newTally(problem.measures.length, k);
		this.heaviest = largestUnits(this.context);
	}

	/**
	 * Moves a unit to a territory (-1: to none) and tells which territories' figures changed.
	 * @throws RangeError for an unknown unit or territory
	 */
	move(unit: number, territory: number): number[] {
		const k = this.known.length;
		const from = this.assignment[unit];
		if (from === undefined || !Number.isInteger(territory) || territory < -1 || territory >= k) {
			throw new RangeError(`Unit ${unit} cannot move to territory ${territory}.`);
		}
		if (from === territory) return [];
		const left = this.members[from < 0 ? k : from];
		left.splice(placeIn(left, unit), 1);
		const joined = this.members[territory < 0 ? k : territory];
		joined.splice(placeIn(joined, unit), 0, unit);
		this.assignment[unit] = territory;
		const touched = this.touchedBy(unit, from, territory);
		for (const t of touched) this.known[t] = null;
		return touched;
	}

	/** Both territories; those next to a unit too when it had or has none, which cuts no borders. */
	private touchedBy(unit: number, from: number, to: number): number[] {
		if (from >= 0 && to >= 0) return [from, to];
		const { offsets, targets } = this.context.problem.graph;
		const around = targets.subarray(offsets[unit], offsets[unit + 1]);
		const touched = new Set([from, to, ...Array.from(around, (v) => this.assignment[v])]);
		touched.delete(-1);
		return [...touched];
	}

	/** Figures of one territory; worked out only if it was touched since. */
	territory(t: number): TerritoryFigures {
		const { context, members, assignment } = this;
		const known = this.known[t];
		if (known) return known;
		const made = territoryFigures(context, t, members[t], assignment);
		tallyUp(this.tally, t, made);
		this.known[t] = made;
		return made;
	}

	/** Units of one territory, ascending; of those without one for -1. */
	unitsOf(t: number): readonly number[] {
		return this.members[t < 0 ? this.known.length : t];
	}

	/** Every figure of the plan; the territories not touched since are the same objects as before. */
	figures(): PlanFigures {
		const territories = this.known.map((known, t) => known ?? this.territory(t));
		return {
			territories,
			...wholeFigures(this.context, this.tally, this.unitsOf(-1), this.heaviest),
		};
	}
}

/** Where a unit stands, or would stand, in an ascending list. */
function placeIn(units: number[], unit: number): number {
	let low = 0;
	let high = units.length;
	while (low < high) {
		const middle = (low + high) >> 1;
		if (units[middle] < unit) low = middle + 1;
		else high = middle;
	}
	return low;
}
