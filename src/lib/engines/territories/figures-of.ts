/** What the planner sees of one measure in one territory. */
export interface MeasureFigures {
	load: number;
	/** NaN for a territory that closes, 0 for a measure that is 0 everywhere */
	target: number;
	/** workload index: 100 is the target; NaN without one */
	index: number;
	/** (load - target) / target; NaN without a target */
	deviation: number;
	/** the same territory today against the same target */
	today: { load: number; index: number; deviation: number };
	/** of today's load what stays, what comes and what goes */
	kept: number;
	gained: number;
	lost: number;
	/** the gained unit with the largest value; ties by lowest number */
	largestGained: UnitShare | null;
	largestUnit: UnitShare | null;
	/** outside the tolerance, inclusive with a slack of 1e-9; false for a measure without one */
	outside: boolean;
}

export interface UnitShare {
	unit: number;
	value: number;
	/** value over the target of its territory; NaN without one */
	share: number;
}

export interface Travel {
	/** from the base to the middle of the area and back; null without a base in it */
	approachKm: number | null;
	/** one round through all units */
	roundKm: number;
	totalKm: number;
}

export interface Shape {
	/** null where outlines are unknown */
	perimeterKm: number | null;
	/** 4 pi area / perimeter²: 1 for a circle; null where outlines are unknown */
	polsbyPopper: number | null;
	/** area / smallest circle around it: 1 for a circle; null where hulls are unknown */
	reock: number | null;
}

export interface TerritoryFigures {
	units: number;
	keptUnits: number;
	gainedUnits: number;
	lostUnits: number;
	/** by measure of the problem */
	measures: MeasureFigures[];
	/** cost of the units it gained */
	gainedCost: number;
	/** its borders with other territories, in joined pairs of units */
	cutBorders: number;
	/** more than one part, or its base is not in it (unless it closes) */
	torn: boolean;
	/** 0 without geometry */
	areaKm2: number;
	/** null without geometry or units */
	travel: Travel | null;
	shape: Shape | null;
}

/** What the planner sees of one measure over the whole plan; territories that close are left out. */
export interface MeasureSummary {
	/** the largest deviation by size, and where; -1 and NaN where no territory has a target */
	largest: { territory: number; deviation: number };
	/** mean of the sizes of the deviations */
	mean: number;
	/** territories outside the tolerance */
	outside: number[];
	/** load of the units that moved, and its share of the total */
	moved: number;
	movedShare: number;
	/** heaviest unit against the target of a full capacity, before anything else */
	largestUnit: UnitShare | null;
	/** a sentence where the tolerance is hard to meet with so few units a territory, else null */
	hard: string | null;
}

export interface PlanFigures {
	territories: TerritoryFigures[];
	measures: MeasureSummary[];
	/** mean number of units of a territory that stays */
	unitsPerTerritory: number;
	/** units that are not where they are today, and their share of all */
	movedUnits: number;
	movedShare: number;
	/** cost of all moves, compulsory ones too */
	movedCost: number;
	/** units without a territory */
	unassigned: number;
	cutBorders: { before: number; after: number };
	/** territories that are torn */
	torn: number[];
}
