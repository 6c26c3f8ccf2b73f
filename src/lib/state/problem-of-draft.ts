import type { BorderList } from '$lib/engines/borders';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import { colouringProblem } from '$lib/engines/editions/colouring-problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { RegionNumbers } from './rules-in-force';

/** The parts of a draft that a colouring depends on; layout and the look of inks are not among them. */
export const colouringParts = (draft: Draft): readonly unknown[] => [
	draft.inks,
	draft.locks,
	draft.forbidden,
	draft.alike,
	draft.apart,
	draft.groups,
	draft.reserved,
	draft.pointTouches,
	draft.leastMetres,
	draft.waterKm,
	draft.struck,
	draft.added,
	draft.seed,
];

/**
 * What is asked of the colouring engine for this draft, staying as near as can be to `previous`. The
 * server asks the very same when the draft is saved, and so gets the same answer.
 */
export const problemOf = (
	draft: Draft,
	keys: readonly string[],
	borders: BorderList,
	numbers: RegionNumbers,
	previous: Int32Array | null,
): ColouringProblem => colouringProblem({ keys, borders }, draft, { numbers, previous });
