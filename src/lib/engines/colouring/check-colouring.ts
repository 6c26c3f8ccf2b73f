import { checkProof } from './check-proof.ts';
import { holdersOfReserved } from './check-reserved.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

/**
 * Everything that is wrong with a result, in plain sentences; empty when it holds. Shares no code with
 * the colourer: it reads the problem's own lists and nothing else. Explanations are checked by
 * `checkExplanation`.
 */
export function checkColouring(problem: ColouringProblem, result: ColouringResult): string[] {
	if (result.status !== 'coloured') return [];
	const { colouring } = result;
	if (colouring.length !== problem.regions) return ['The colouring does not cover every region.'];
	return [
		...inkErrors(problem, colouring, result.inksUsed),
		...pairErrors(problem, colouring),
		...regionErrors(problem, colouring),
		...changeErrors(problem, result),
		...boundErrors(result),
		...checkProof(problem, result),
	].slice(0, 50);
}

function inkErrors(problem: ColouringProblem, colouring: Int32Array, inksUsed: number): string[] {
	const errors: string[] = [];
	let used = 0;
	for (let r = 0; r < colouring.length; r++) {
		if (!Number.isInteger(colouring[r]) || colouring[r] < 0) errors.push(`Region ${r} has no ink.`);
		if (colouring[r] + 1 > used) used = colouring[r] + 1;
	}
	if (typeof problem.inks === 'number' && used > problem.inks) {
		errors.push(`Ink ${used - 1} is used, but there are ${problem.inks} inks.`);
	}
	if (problem.inks === 'fewest' ? used > inksUsed : used !== inksUsed) {
		errors.push(`${inksUsed} inks are said to be used, but the highest used is ${used - 1}.`);
	}
	return errors;
}

function pairErrors(problem: ColouringProblem, colouring: Int32Array): string[] {
	const errors: string[] = [];
	const { a, b } = problem.borders;
	for (let i = 0; i < a.length; i++) {
		if (colouring[a[i]] === colouring[b[i]]) {
			errors.push(`Bordering regions ${a[i]} and ${b[i]} have the same ink.`);
		}
	}
	for (const [p, q] of problem.apart ?? []) {
		if (colouring[p] === colouring[q]) errors.push(`Regions ${p} and ${q} are not kept apart.`);
	}
	for (const [p, q] of problem.alike ?? []) {
		if (colouring[p] !== colouring[q]) errors.push(`Regions ${p} and ${q} are not kept alike.`);
	}
	return errors;
}

function regionErrors(problem: ColouringProblem, colouring: Int32Array): string[] {
	const errors: string[] = [];
	const { locks, forbidden } = problem;
	for (let r = 0; locks && r < locks.length; r++) {
		if (locks[r] >= 0 && locks[r] !== colouring[r])
			errors.push(`The lock of region ${r} is broken.`);
	}
	for (const [region, ink] of forbidden ?? []) {
		if (colouring[region] === ink) errors.push(`Region ${region} has its forbidden ink ${ink}.`);
	}
	return [...errors, ...reservedErrors(problem, colouring)];
}

function reservedErrors(problem: ColouringProblem, colouring: Int32Array): string[] {
	const holders = holdersOfReserved(problem);
	const errors: string[] = [];
	colouring.forEach((ink, region) => {
		if (holders.get(ink)?.has(region) !== false) return;
		errors.push(`Region ${region} has the reserved ink ${ink}, but no lock gives it.`);
	});
	return errors;
}

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

function changeErrors({ previous }: ColouringProblem, { colouring, changes }: Coloured): string[] {
	if (!changes) return [];
	if (!previous) return ['Changes are counted, but there was no previous colouring.'];
	let count = 0;
	for (let r = 0; r < previous.length; r++) {
		if (previous[r] >= 0 && previous[r] !== colouring[r]) count++;
	}
	const errors: string[] = [];
	if (count !== changes.count) errors.push(`${count} regions changed, not ${changes.count}.`);
	if (changes.lowerBound > count) errors.push('Fewer regions changed than is said to be possible.');
	return errors;
}

function boundErrors({ lowerBound, inksUsed, proof }: Coloured): string[] {
	if (lowerBound > inksUsed) return ['The lower bound is above the number of inks used.'];
	if (proof.kind !== 'not-proved' && lowerBound < inksUsed) {
		return ['A proof is given, but the lower bound is below the number of inks used.'];
	}
	return [];
}
