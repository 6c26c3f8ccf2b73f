import { z } from 'zod';
import type { Gain, OpenQuestion } from '../engines/colouring/open-question.ts';

/** Longer searches for what a colouring leaves open: what they are asked with and what the desk is told. */

export const searchStates = [
	...(['waiting', 'running', 'stored', 'kept', 'nothing', 'failed', 'cancelled'] as const),
] as const;
/**
 * `stored`: what was found is a revision of the sheet; `kept`: it was found for rules that have changed
 * since; `nothing`: no better answer was found.
 */
export type SearchState = (typeof searchStates)[number];

/** How long, as multiples of a thorough search. */
export const searchTimes = [1, 10, 100] as const;

/** A thorough search takes so many times the steps of the one that answers at the desk. */
export const stepsOfThorough = 20;

const times = z.union(searchTimes.map((one) => z.literal(one)));

/** Body of `POST /api/v1/sheets/{sheet}/searches`. */
export const beginSearch = z.strictObject({
	revision: z.int().min(0).optional().describe('refused with 409 when the draft is another by now'),
	times: times.default(1).describe('how long: multiples of a thorough search'),
});
export type BeginSearch = z.output<typeof beginSearch>;

/** The same as a form, and the form that stops one. */
export const beginSearchForm = z.object({
	revision: z.coerce.number().int().min(0),
	times: z.coerce.number().pipe(times),
});
export const stopSearchForm = z.object({ search: z.coerce.number().int().min(1) });

export interface SearchNote {
	number: number;
	state: SearchState;
	question: OpenQuestion;
	times: number;
	/** the draft it is about */
	revision: number;
	/** what is known so far, in a sentence */
	step: string;
	/** of the steps that the question at hand may take, 0 to 1 */
	share: number;
	gain: Gain | null;
	/** what came of it; '' while it is open */
	sentence: string;
	storedRevision: number | null;
	createdAt: string;
	createdBy: string | null;
	/** when it ended, or was last heard of */
	updatedAt: string;
}

export const isOpenSearch = ({ state }: Pick<SearchNote, 'state'>): boolean =>
	state === 'waiting' || state === 'running';

/** A search with the inks that it found, where that is a colouring. */
export interface SearchFound extends SearchNote {
	inks: number[] | null;
}
