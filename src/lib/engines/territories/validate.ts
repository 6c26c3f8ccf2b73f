import type { TerritoryProblem } from './problem.ts';
import { mostSteps } from './today-steps.ts';

/**
 * Refuses what no caller may ask.
 * @throws RangeError when lists differ in length, a number of a unit or territory is out of range, two
 * territories that stay share a base, a unit is to be apart from itself, or a setting leaves its range
 */
export function validate(problem: TerritoryProblem): void {
	checkLengths(problem);
	checkNumbers(problem);
	checkBases(problem);
	checkSettings(problem);
}

function checkLengths({ graph, measures, today, locks, cost }: TerritoryProblem): void {
	const units = graph.count;
	const require = (name: string, length: number) => {
		if (length !== units) throw new RangeError(`${name}: ${length} entries for ${units} units.`);
	};
	require('today', today.length);
	measures.forEach((measure, m) => require(`measures[${m}].values`, measure.values.length));
	if (locks) require('locks', locks.length);
	if (cost) require('cost', cost.length);
}

function checkNumbers({ graph, today, locks, together, apart, territories }: TerritoryProblem) {
	const within = (name: string, value: number, least: number, count: number) => {
		if (Number.isInteger(value) && value >= least && value < count) return;
		throw new RangeError(`${name}: ${value} is not a whole number from ${least} to ${count - 1}.`);
	};
	for (let u = 0; u < graph.count; u++) {
		within(`today[${u}]`, today[u], -1, territories.length);
		if (locks) within(`locks[${u}]`, locks[u], -1, territories.length);
	}
	for (const pair of [...(together ?? []), ...(apart ?? [])]) {
		for (const unit of pair) within('together or apart', unit, 0, graph.count);
	}
	territories.forEach(({ base }, t) => within(`territories[${t}].base`, base, -1, graph.count));
	for (const [a, b] of apart ?? []) {
		if (a === b) throw new RangeError(`Unit ${a} cannot be apart from itself.`);
	}
}

function checkBases({ territories }: TerritoryProblem): void {
	const owner = new Map<number, number>();
	territories.forEach(({ base, capacity, closing }, t) => {
		if (!(capacity > 0 && capacity < Infinity)) {
			throw new RangeError(`territories[${t}].capacity: ${capacity} is not above 0.`);
		}
		if (base < 0 || closing) return;
		const other = owner.get(base);
		if (other !== undefined) {
			throw new RangeError(`Unit ${base} is the base of territories ${other} and ${t}.`);
		}
		owner.set(base, t);
	});
}

function checkSettings({ measures, compactness, reach, seed }: TerritoryProblem): void {
	for (const { name, tolerance } of measures) {
		if (tolerance !== null && !(tolerance >= 0 && tolerance < Infinity)) {
			throw new RangeError(`The tolerance of ${name} is ${tolerance}.`);
		}
	}
	if (compactness !== undefined && !(compactness >= 0 && compactness <= 1)) {
		throw new RangeError(`compactness: ${compactness} is not from 0 to 1.`);
	}
	if (reach !== null && !(Number.isInteger(reach) && reach >= 0 && reach <= mostSteps)) {
		throw new RangeError(`reach: ${reach} is not a whole number from 0 to ${mostSteps}.`);
	}
	if (!(Number.isInteger(seed) && seed >= 0 && seed <= 0xffffffff)) {
		throw new RangeError(`seed: ${seed} is not a whole number from 0 to 2^32 - 1.`);
	}
}

/**
 * What moving each unit costs; 1 each where nothing is said.
 * @throws RangeError for a cost that is not a number of 0 or more
 */
export function costsOf({ cost, graph }: TerritoryProblem): Float64Array {
	if (!cost) return new Float64Array(graph.count).fill(1);
	cost.forEach((value, u) => {
		if (!(value >= 0 && value < Infinity)) throw new RangeError(`cost[${u}]: ${value}`);
	});
	return cost;
}
