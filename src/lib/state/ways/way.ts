import type { Release } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';

/** One way out of a collision: what would be given up, and the draft without it. */
export interface Way {
	/** the same for the same way, however often ways are listed */
	id: string;
	/** `release`: the cheapest set of locks; `lock`: a single one of those that collide */
	kind: 'release' | 'inks' | 'rule' | 'lock';
	/** what is given up, in words: "Release Oregon and Idaho" */
	gives: string;
	/** what the locks given up weigh; null where no lock is */
	weight: number | null;
	/** what more has to be known of it, '' for nothing */
	note: string;
	/** as Undo will name it */
	label: string;
	change: (draft: Draft) => Draft;
	/** why it is known beforehand that it does not work, '' otherwise */
	hopeless: string;
}

/** A way that was worked out. */
export type WayOutcome =
	| { state: 'waiting' | 'working' }
	| {
			state: 'works';
			answer: Extract<DeskColouring, { status: 'coloured' }>;
			inks: Int32Array;
			inksUsed: number;
			/** regions with another ink than on the sheet now */
			changed: number[];
			/** CIEDE2000 of the closest two inks that touch, for whoever sees them least apart */
			least: number | null;
	  }
	| { state: 'fails'; words: string };

export interface WayRow {
	way: Way;
	outcome: WayOutcome;
}

/** What the cheapest release weighs, as far as it is known. */
export function releaseNote({ cost, lowerBound, proved }: Release): string {
	if (proved) return 'Nothing cheaper would do.';
	const known = `Costs ${weightWords(cost)}`;
	if (lowerBound <= 0) return `${known}; less may be enough.`;
	return `${known}; at least ${weightWords(lowerBound)} has to go, by what was worked out so far.`;
}

export const weightWords = (weight: number): string => String(Math.round(weight * 100) / 100);
