import { bordersForSheet, type BorderList } from '../../engines/borders/index.ts';
import { problemFaults, type ColouringProblem } from '../../engines/colouring/index.ts';
import { colouringProblem, strangersIn } from '../../engines/editions/colouring-problem.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import { Unfit } from './outcomes.ts';

/** The regions and borders a draft is about. */
export interface DraftGround {
	keys: string[];
	borders: BorderList;
}

/**
 * What the colouring engine is asked for by a draft, regions named by number instead of by key; with a
 * colouring before, as few regions as can be change their ink.
 * Throws `Unfit` when the draft names a region the boundary set does not have, or a rule that cannot be.
 */
export function problemOf(
	ground: DraftGround,
	draft: Draft,
	previous: ArrayLike<number> | null = null,
): ColouringProblem {
	const unknown = strangersIn(ground.keys, draft);
	if (unknown.length > 0) {
		throw new Unfit('unknown-region', `the sheet has no region "${unknown[0]}"`, {
			regions: unknown.slice(0, 20),
		});
	}
	const problem = colouringProblem(ground, draft, { previous });
	const faults = problemFaults(problem);
	if (faults.length > 0) throw new Unfit('unfit-rules', faults[0], { faults: faults.slice(0, 20) });
	return problem;
}

/** The borders that bind on a sheet: as found, without those struck out, with those added by hand. */
export const sheetBorders = ({ keys, borders }: DraftGround, draft: Draft): BorderList =>
	bordersForSheet(keys, borders, draft);
