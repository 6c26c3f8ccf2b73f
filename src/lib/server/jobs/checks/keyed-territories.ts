import { buildGraph } from '../../../engines/graph/index.ts';
import type { Impossible, Measure, TerritoryProblem } from '../../../engines/territories/index.ts';
import type { TerritoriesRequest } from '../../../schemas/api/check-territories.ts';
import { ApiFault } from '../../api/fault.ts';

/** A problem, or why figures that it needs are missing, which is an answer and no fault of the request. */
export type RequestedProblem = { problem: TerritoryProblem } | { missing: Impossible };

/** The problem of a request, units and territories by number in the order given. Names what does not fit. */
export function problemOfRequest(request: TerritoriesRequest): RequestedProblem {
	const unitKeys = request.units.map(({ key }) => key);
	const unit = numbering('units', 'unit', unitKeys);
	const territory = numbering(
		'territories',
		'territory',
		request.territories.map(({ key }) => key),
	);
	const pairs = (name: 'borders' | 'together' | 'apart') =>
		request[name].map(([a, b], place) => {
			const at = `${name}.${place}`;
			if (a === b) throw malformed(at, `"${a}" is paired with itself`);
			return [unit(a, at), unit(b, at)] as const;
		});
	requireMeasures(request);
	requireBases(request);
	const locks = new Int32Array(unitKeys.length).fill(-1);
	for (const [key, to] of Object.entries(request.locks)) {
		locks[unit(key, `locks.${key}`)] = territory(to, `locks.${key}`);
	}
	const borders = pairs('borders');
	const { goal, reach, seed, effort } = request;
	const cost = costOf(request);
	if ('missing' in cost) return cost;
	const problem: TerritoryProblem = {
		graph: buildGraph(
			unitKeys.length,
			borders.map(([a]) => a),
			borders.map(([, b]) => b),
		),
		measures: measuresOf(request),
		today: Int32Array.from(request.units, ({ territory: key }, place) =>
			key === null ? -1 : territory(key, `units.${place}.territory`),
		),
		territories: request.territories.map(({ base, capacity, frozen, closing }, place) => ({
			base: base === null ? -1 : unit(base, `territories.${place}.base`),
			...{ capacity, frozen, closing },
		})),
		...{ locks, together: pairs('together'), apart: pairs('apart') },
		...cost,
		...{ goal, reach, seed, effort },
	};
	return { problem };
}

/** Names of measures, those with a tolerance first, each once and in the order they are met. */
export function measureNames({ units, tolerance }: TerritoriesRequest): string[] {
	const names = new Set(Object.keys(tolerance));
	for (const { measures } of units) for (const name in measures) names.add(name);
	return [...names];
}

/**
 * Those with a tolerance, whatever their values: the engine tells what is missing. Of the others only
 * those without a gap, for they bind nothing and are only told.
 */
function measuresOf(request: TerritoriesRequest): Measure[] {
	return measureNames(request).flatMap((name) => {
		const values = valuesOf(request, name);
		const tolerance = Object.hasOwn(request.tolerance, name) ? request.tolerance[name] : null;
		const isWhole = values.every(isUsable) && values.some((value) => value > 0);
		return tolerance !== null || isWhole ? [{ name, values, tolerance }] : [];
	});
}

const valuesOf = ({ units }: TerritoriesRequest, name: string): Float64Array =>
	Float64Array.from(units, ({ measures }) =>
		Object.hasOwn(measures, name) ? (measures[name] ?? NaN) : NaN,
	);

const isUsable = (value: number) => value >= 0 && value < Infinity;

function costOf(request: TerritoriesRequest): { cost?: Float64Array } | { missing: Impossible } {
	const { cost: name } = request;
	if (name === 'units') return {};
	const cost = valuesOf(request, name);
	const units = Array.from(cost.keys()).filter((unit) => !isUsable(cost[unit]));
	if (units.length === 0) return { cost };
	const shown = units.slice(0, 5).map((unit) => `#${unit}`);
	const more = units.length > 5 ? ` and ${units.length - 5} more` : '';
	return {
		missing: {
			...{ status: 'impossible', reason: 'missing-value' },
			message: `Moves are counted by ${name}, which has no value of 0 or more for ${shown.join(', ')}${more}.`,
			witness: { units, territories: [] },
			relief: [],
		},
	};
}

/** A measure that no unit has was mistyped. */
function requireMeasures(request: TerritoriesRequest): void {
	const known = new Set<string>(['units']);
	for (const { measures } of request.units) for (const name in measures) known.add(name);
	for (const name of Object.keys(request.tolerance)) {
		if (name === 'units' ? !hasUnits(request) : !known.has(name)) {
			throw malformed(`tolerance.${name}`, `no unit has the measure "${name}"`);
		}
	}
	if (!known.has(request.cost)) {
		throw malformed('cost', `no unit has the measure "${request.cost}"`);
	}
}

const hasUnits = ({ units }: TerritoriesRequest) =>
	units.some(({ measures }) => Object.hasOwn(measures, 'units'));

/** Two territories that stay cannot be rooted in one unit. */
function requireBases({ territories }: TerritoriesRequest): void {
	const seen = new Set<string>();
	territories.forEach(({ base, closing }, place) => {
		if (base === null || closing) return;
		if (seen.has(base)) {
			throw malformed(`territories.${place}.base`, `"${base}" is the base of two territories`);
		}
		seen.add(base);
	});
}

function numbering(
	list: string,
	what: string,
	keys: readonly string[],
): (key: string, at: string) => number {
	const numbers = new Map<string, number>();
	keys.forEach((key, place) => {
		if (numbers.has(key)) throw malformed(`${list}.${place}`, `"${key}" is there twice`);
		numbers.set(key, place);
	});
	return (key, at) => {
		const found = numbers.get(key);
		if (found === undefined) throw malformed(at, `there is no ${what} "${key}"`);
		return found;
	};
}

const malformed = (path: string, message: string) =>
	new ApiFault(400, 'malformed', `${path}: ${message}`, { issues: [{ path, message }] });
