import { putNames } from '../../engines/territories/put-names.ts';
import type { Relief } from '../../engines/territories/problem.ts';
import type { Wishes } from '../../engines/territories/territory-draft.ts';
import type { ProposalOutcome } from '../../schemas/desk-territories.ts';
import type { PlanNames } from './proposal-result.ts';

/** Proposals in sentences, with names in place of numbers. */

export const inWords = (message: string, { regions, territories }: PlanNames): string =>
	putNames(
		message,
		(unit) => regions[unit] ?? `region ${unit + 1}`,
		(territory) => territories[territory] ?? `territory ${territory + 1}`,
	);

const figure = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });
const regionsInWords = (count: number) =>
	count === 1 ? '1 region' : `${figure.format(count)} regions`;

/** A share in per cent with one decimal, rounded up so that what is said would really do. */
export const percentUp = (share: number): string =>
	`${figure.format(Math.ceil(share * 1000 - 1e-6) / 10)} %`;

/** `Moved 18 regions, at least 14 needed.` and whatever else a reader must know at once. */
export function planSentence(outcome: ProposalOutcome, wishes: Wishes, names: PlanNames): string {
	return [
		movedSentence(outcome, wishes, names),
		outcome.compulsory > 0 ? compulsorySentence(outcome.compulsory) : '',
		outcome.outside > 0 ? outsideSentence(outcome.outside) : '',
		outcome.faults.length > 0 ? `It breaks a rule: ${outcome.faults[0]}` : '',
	]
		.filter((sentence) => sentence !== '')
		.join(' ');
}

function movedSentence(
	{ moved, cost, lowerBound, proved, largest }: ProposalOutcome,
	{ goal }: Wishes,
	{ cost: costName }: PlanNames,
): string {
	if (moved === 0) return 'Nothing has to move.';
	const what = costName === null ? '' : ` with ${figure.format(cost)} of ${costName}`;
	const start = `Moved ${regionsInWords(moved)}${what}`;
	if (goal === 'least-deviation') {
		const most = Math.max(0, ...Object.values(largest));
		return `${start}; the largest deviation is ${percentUp(most)}.`;
	}
	if (proved) return `${start}; no plan does with less.`;
	if (!(lowerBound > 0)) return `${start}.`;
	const least = costName === null ? Math.ceil(lowerBound - 1e-6) : lowerBound;
	return `${start}, at least ${figure.format(least)} needed.`;
}

const compulsorySentence = (count: number) =>
	count === 1
		? 'One of them had to, whatever the plan.'
		: `${figure.format(count)} of them had to, whatever the plan.`;

const outsideSentence = (count: number) =>
	count === 1
		? 'One territory lies outside the tolerance.'
		: `${figure.format(count)} territories lie outside the tolerance.`;

/** Why there is no plan, and the tolerance with which this reason would be gone. */
export function impossibleSentence(
	message: string,
	relief: readonly Relief[],
	names: PlanNames,
	{ tolerances }: Wishes,
): string {
	const wider = relief.find((one) => one.kind === 'tolerance');
	const told = inWords(message, names);
	if (wider?.kind !== 'tolerance') return `No plan: ${told}`;
	const { id } = names.measures[wider.measure];
	return `No plan within ${percentUp(tolerances[id])}: ${told}`;
}

/** The smallest change that would help, as an offer. */
export function reliefSentence(relief: Relief, names: PlanNames): string {
	switch (relief.kind) {
		case 'tolerance':
			return `A tolerance of ${percentUp(relief.value)} for ${names.measures[relief.measure].name} would do.`;
		case 'unlock':
			return `Unlock ${names.regions[relief.unit]}.`;
		case 'unfreeze':
			return `Unfreeze ${names.territories[relief.territory]}.`;
		case 'split':
			return `Split ${names.regions[relief.unit]} into smaller regions.`;
	}
}
