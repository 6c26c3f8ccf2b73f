import {
	checkBound,
	colour,
	gainOf,
	mostConflicts,
	proveBound,
	type ColouringProblem,
	type ColouringResult,
	type Gain,
} from '../../engines/colouring/index.ts';
import { problemOf } from '../services/draft-problem.ts';
import { faultsIn, type DraftInput } from './colour.work.ts';
import { takeOver } from './take-over.ts';
import { teller, type Task } from './task-port.ts';

export interface SearchInput extends DraftInput {
	/** what is known by now */
	known: ColouringResult;
	/** the inks shown, to stay near to where fewer do; null before the first colouring */
	shown: number[] | null;
	effort: 'quick' | 'normal' | 'thorough';
	times: number;
}

export interface SearchOutcome {
	/** null: no better answer than the one known */
	gain: Gain | null;
	result: ColouringResult;
	/** what the checker found wrong */
	faults: string[];
}

/** Longer refutations are too long to be stored and replayed. */
const mostProof = 16_000_000;

/** Asks the engine again with more effort, and has the checker look at whatever is better than known. */
export async function searchLonger({ input, port }: Task<SearchInput>): Promise<SearchOutcome> {
	const { known, shown, effort, times } = input;
	const problem: ColouringProblem = {
		...problemOf(input, input.draft, shown),
		...{ effort, effortTimes: times },
	};
	const told = { ...problem, ...telling(problem, teller(port)) };
	const found = shortened(await colour(told));
	const result = bounded(told, known, kept(problem, known, found));
	const gain = gainOf(known, result);
	return { gain, result, faults: gain ? await faultsIn(problem, result) : [] };
}

/** Says what is known, and how much of what one question may take has been spent. */
function telling(
	problem: ColouringProblem,
	tell: (step: string, share: number) => void,
): Pick<ColouringProblem, 'bounds' | 'cancelled' | 'releaseFound'> {
	const most = mostConflicts(problem);
	let words = 'Looking at the whole sheet.';
	return {
		bounds(atLeast, enough) {
			words = boundsInWords(atLeast, enough);
			tell(words, 0);
		},
		releaseFound({ cost, lowerBound }) {
			words = releaseInWords(cost, lowerBound);
			tell(words, 0);
		},
		cancelled(conflicts) {
			if (conflicts !== undefined) tell(words, Math.min(1, conflicts / most));
			return false;
		},
	};
}

export function boundsInWords(atLeast: number, enough: number | null): string {
	const least = `At least ${atLeast} ${atLeast === 1 ? 'ink is' : 'inks are'} needed`;
	if (enough === null) return `${least}.`;
	if (enough > atLeast)
		return `${least}; ${enough} do. Whether ${enough - 1} do is being looked at.`;
	return `${enough} inks do and no fewer. A proof to show is being looked for.`;
}

const figure = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });

const releaseInWords = (cost: number, atLeast: number): string =>
	`Releasing locks that cost ${figure.format(cost)} in all is enough; any release costs at least ${figure.format(atLeast)}.`;

/** With as many inks as before the sheet stays as it is: only what is known of it changes. */
function kept(
	problem: ColouringProblem,
	known: ColouringResult,
	found: ColouringResult,
): ColouringResult {
	if (known.status !== 'coloured' || found.status !== 'coloured') return found;
	if (found.inksUsed !== known.inksUsed) return found;
	return takeOver(problem, found, Array.from(known.colouring)) ?? found;
}

/** A bound that was raised without a proof of the whole is kept only with a proof of its own. */
function bounded(
	problem: ColouringProblem,
	known: ColouringResult,
	found: ColouringResult,
): ColouringResult {
	if (found.status !== 'coloured' || found.proof.kind !== 'not-proved') return found;
	const before = known.status === 'impossible' ? 0 : known.lowerBound;
	if (found.lowerBound <= before) return { ...found, lowerBound: Math.min(before, found.inksUsed) };
	const { lowerBound } = found;
	const holds = checkBound(problem, lowerBound, proveBound(problem, lowerBound)).length === 0;
	return holds ? found : { ...found, lowerBound: Math.min(before, found.inksUsed) };
}

function shortened(found: ColouringResult): ColouringResult {
	if (found.status !== 'coloured') return found;
	const length = found.proof.refutation?.clauses.length ?? 0;
	return length > mostProof ? { ...found, proof: { kind: 'not-proved', regions: [] } } : found;
}
