import type { BorderKind } from '../engines/borders/border-list.ts';
import type { Finding } from '../engines/boundaries/finding.ts';
import type { Mend } from '../engines/boundaries/mends/mend.ts';
import type { Found, Question } from '../engines/boundaries/question.ts';
import type { ReadingFields } from './upload.ts';
import type { RememberedAnswer } from './desk.ts';

/**
 * A re-cut as its pages and the API show it: a change of a sheet's boundaries (another file, another reading
 * of the same file, or mends) that is read, compared with what stands, confirmed, and can be put back.
 */
export interface RecutRow {
	/** counted within the sheet */
	number: number;
	kind: 'file' | 'reading' | 'mends';
	state:
		| 'waiting'
		| 'reading'
		| 'asking'
		| 'ready'
		| 'applied'
		| 'put-back'
		| 'dropped'
		| 'refused'
		| 'cancelled'
		| 'failed';
	fileName: string;
	/** what it does, in one sentence */
	words: string;
	step: string;
	share: number;
	createdAt: string;
	createdBy: string | null;
	appliedAt: string | null;
	appliedBy: string | null;
	putBackAt: string | null;
	putBackBy: string | null;
}

export interface RecutPage extends RecutRow {
	options: ReadingFields & { mends?: Mend[] };
	question: Question | null;
	remembered: RememberedAnswer[];
	refusal: { code: string; message: string; findings: Finding[] } | null;
	found: Found | null;
	/** the sheet got other boundaries since this was read, so it has to be read again */
	stale: boolean;
	/** why it cannot be applied now; null when it can */
	hindrance: string | null;
	/** null until it was read */
	change: RecutChange | null;
	/** what people decided about the matching */
	decisions: RecutDecision[];
	/** what followed and what did not: foreseen while it is ready, as it came once it is applied */
	report: CarriedRow[];
	/** what was done since it was applied and would be taken away by putting it back, in sentences */
	loses: string[];
}

export interface RecutChange {
	regions: { before: number; after: number };
	/** how many regions before went which way */
	counts: Record<RecutOutcome, number>;
	/** all but plainly kept regions, doubtful ones first; at most `mostListed` */
	groups: RecutGroup[];
	groupsLeftOut: number;
	/** at most `mostListed` each; `counts` are whole */
	pairs: {
		gained: PairChange[];
		lost: PairChange[];
		changed: PairChange[];
		counts: { gained: number; lost: number; changed: number };
	};
	/** findings that are no longer there, and those that are new; at most `mostFindings` each */
	findings: { gone: Finding[]; come: Finding[]; counts: { gone: number; come: number } };
}

/** Longer lists are cut, and it is said how long they are. */
export const mostListed = 2_000;
export const mostFindings = 500;

export type RecutOutcome = 'kept' | 'renamed' | 'split' | 'merged' | 'redrawn' | 'new' | 'gone';

export interface RecutGroup {
	outcome: RecutOutcome;
	before: RecutRegion[];
	after: RecutRegion[];
	by: 'key' | 'area' | 'hand';
	/** why somebody should look at it; null when it is sure */
	doubt: string | null;
	/** what happened, in plain sentences */
	words: string;
}

export interface RecutRegion {
	key: string;
	name: string;
	areaKm2: number;
	/** share of its area that the other side of the group covers, 0 to 1 */
	share: number;
}

/** Regions by key; null where there is no border on that side. */
export interface PairChange {
	a: string;
	b: string;
	before: { kind: BorderKind; metres: number } | null;
	after: { kind: BorderKind; metres: number } | null;
	at: [number, number] | null;
}

export interface CarriedRow {
	stage: 'draft' | 'territories' | 'measures';
	/** a lock, a forbidden ink, a base, a measure ... */
	what: string;
	/** the old regions that it named, and the new ones that have it now */
	keys: string[];
	now: string[];
	/**
	 * `doubled`: it said the same as another that stands; `settled`: several disagreed and the one with more
	 * area was taken; `changed`: its figures were carried over
	 */
	outcome: 'followed' | 'copied' | 'doubled' | 'dropped' | 'settled' | 'changed';
	/** one sentence */
	words: string;
}

/**
 * What somebody decides about the matching: an old region continues as these new ones (none: it is gone), or,
 * where `before` is null, these new ones stand for no old one.
 */
export interface RecutDecision {
	before: string | null;
	after: string[];
}
