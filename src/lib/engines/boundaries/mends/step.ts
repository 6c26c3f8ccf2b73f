import type { Clip } from './clip.ts';
import type { Draft } from './draft.ts';

/** What a step that was applied did, in a sentence, and where. */
export interface Done {
	done: string;
	at: [number, number] | null;
	/** keys of the regions that are still there */
	regions: string[];
}

/** Why a step did nothing; `later` when it may do something once the map is matched again. */
export interface Refused {
	why: string;
	later: boolean;
}

export type Outcome = Done | Refused;

/** What the steps work with. */
export interface Bench {
	draft: Draft;
	clip: Clip;
	keys: string[];
	/** corners that may still be handed to the clipping library */
	corners: number;
}

export const never = (why: string): Refused => ({ why, later: false });

/** Corners of two outlines, or of one that crosses itself, beyond which no step cuts. */
export const mostCorners = 100_000;
/** Places where an outline crosses itself beyond which it is not made valid: that takes a millisecond each. */
export const mostOwnCrossings = 1000;
/** Places where two outlines cross beyond which one is not cut from the other. */
export const mostCrossings = 20_000;
/** Corners that all steps together may cut. */
export const mostCornersInAll = 4_000_000;
