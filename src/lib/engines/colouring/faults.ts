import type { ColouringProblem } from './problem.ts';

/** The highest number of inks the engine is asked for; far above any palette. */
export const mostInks = 65_535;

/**
 * What makes a problem unfit to be solved, in plain sentences; empty when it is well formed. A well
 * formed problem may still be impossible: that is an outcome, not a fault.
 */
export function problemFaults(problem: ColouringProblem): string[] {
	if (!isCount(problem.regions)) return ['The number of regions must be a whole number from 0.'];
	return [
		...inkFaults(problem),
		...pairFaults(problem.regions, problem.borders.a, problem.borders.b),
		...ruleFaults(problem),
		...weightFaults(problem),
	];
}

const isCount = (value: number) => Number.isInteger(value) && value >= 0 && value < 2 ** 31;

function inkFaults(problem: ColouringProblem): string[] {
	const { inks, regions, locks, previous, forbidden, reserved } = problem;
	const faults: string[] = [];
	if (inks !== 'fewest' && !(Number.isInteger(inks) && inks >= 1 && inks <= mostInks)) {
		faults.push(`The number of inks must be 'fewest' or a whole number from 1 to ${mostInks}.`);
	}
	for (const [name, list] of [
		['locks', locks],
		['previous', previous],
	] as const) {
		if (!list) continue;
		if (list.length !== regions) faults.push(`'${name}' must have one entry for each region.`);
		else if (!list.every((ink) => ink >= -1 && ink < mostInks)) {
			faults.push(`'${name}' holds an ink outside -1 to ${mostInks - 1}.`);
		}
	}
	const bad = forbidden?.find(
		([region, ink]) => !(isCount(region) && region < regions && isCount(ink) && ink < mostInks),
	);
	if (bad) faults.push(`'forbidden' names region ${bad[0]} and ink ${bad[1]}, which do not exist.`);
	const stray = reserved?.find((ink) => !(isCount(ink) && ink < mostInks));
	if (stray !== undefined) faults.push(`'reserved' names ink ${stray}, which does not exist.`);
	return faults;
}

function pairFaults(regions: number, a: ArrayLike<number>, b: ArrayLike<number>): string[] {
	if (a.length !== b.length) return ['The two lists of border ends differ in length.'];
	for (let i = 0; i < a.length; i++) {
		const fault = pairFault(regions, a[i], b[i]);
		if (fault) return [`Border ${i}: ${fault}`];
	}
	return [];
}

function pairFault(regions: number, a: number, b: number): string | null {
	if (!(Number.isInteger(a) && a >= 0 && a < regions)) return `region ${a} does not exist.`;
	if (!(Number.isInteger(b) && b >= 0 && b < regions)) return `region ${b} does not exist.`;
	return a === b ? `region ${a} cannot border itself.` : null;
}

function ruleFaults({ regions, alike, apart }: ColouringProblem): string[] {
	const faults: string[] = [];
	for (const [a, b] of alike ?? []) {
		const fault = a === b ? null : pairFault(regions, a, b);
		if (fault) faults.push(`Keep alike: ${fault}`);
	}
	for (const [a, b] of apart ?? []) {
		const fault = pairFault(regions, a, b);
		if (fault) faults.push(`Keep apart: ${fault}`);
	}
	return faults.slice(0, 20);
}

function weightFaults(problem: ColouringProblem): string[] {
	const { regions, areas, lockCosts, lengths, borders, inkDistances } = problem;
	const faults: string[] = [];
	const fits = (list: ArrayLike<number>, length: number, fine: (value: number) => boolean) =>
		list.length === length && Array.prototype.every.call(list, fine);
	const weight = (value: number) => Number.isFinite(value) && value >= 0;
	if (areas && !fits(areas, regions, weight)) {
		faults.push("'areas' must have one finite weight from 0 for each region.");
	}
	if (lockCosts && !fits(lockCosts, regions, (cost) => Number.isFinite(cost) && cost > 0)) {
		faults.push("'lockCosts' must have one finite cost above 0 for each region.");
	}
	if (lengths && !fits(lengths, borders.a.length, weight)) {
		faults.push("'lengths' must have one finite length from 0 for each border.");
	}
	if (inkDistances?.some((row) => !fits(row, inkDistances.length, weight))) {
		faults.push("'inkDistances' must be a square table of finite distances from 0.");
	}
	return faults;
}
