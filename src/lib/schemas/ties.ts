import { z } from 'zod';

/** Adjoining sheets as the desk is told of them. */

/** Lines of the two sheets within so many metres are taken for one, unless somebody asks for another width. */
export const usualWithin = 1;

export const tieQuery = z.object({
	/** metres */
	within: z.coerce.number().min(0.01).max(1_000).default(usualWithin),
});

/** Another sheet of the team that could be tied to. */
export interface AdjoiningSheet {
	number: number;
	name: string;
	/** whether the extents of the two meet, as far as their borders tell */
	meets: boolean;
	/** its latest edition, null before the first */
	edition: number | null;
	/** of the draft that would be followed */
	revision: number;
}

/** How a tie of the saved draft stands. */
export interface TieState {
	sheet: number;
	/** the other sheet's name by now; null where it is not there any more */
	name: string | null;
	/** what would be followed now; null where nothing can be */
	latest: { edition: number | null; revision: number } | null;
	/** the other sheet has other inks by now, or a newer edition */
	stale: boolean;
}

/** `GET sheets/[sheet]/ties` */
export interface SheetTies {
	adjoining: AdjoiningSheet[];
	states: TieState[];
}
