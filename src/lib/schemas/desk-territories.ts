import type { Impossible, Relief } from '../engines/territories/problem.ts';
import type { TerritoryDraft, Wishes } from '../engines/territories/territory-draft.ts';

/**
 * What the stages of measures and territories are given by the server. Regions are numbered as in
 * `DeskRegions`, territories in the order of the draft's list; long lists are columns.
 */
export interface DeskMeasure {
	id: string;
	name: string;
	unit: string;
	/** name of the table it came with */
	table: string;
	/** may be personal or confidential: whoever uploaded it said so */
	confidential: boolean;
	/** one a region; null where it is missing */
	values: (number | null)[];
	missing: number;
	total: number;
	/** joined to an earlier boundary set than the sheet's */
	stale: boolean;
}

/** A column of words that came with a table, such as the territory of every account. */
export interface DeskTextColumn {
	id: string;
	name: string;
	table: string;
	texts: (string | null)[];
	/** joined to an earlier boundary set than the sheet's */
	stale: boolean;
}

export interface DeskTerritories {
	/** 0 before the first save */
	revision: number;
	savedBy: string | null;
	savedAt: string | null;
	draft: TerritoryDraft;
	/** ink number of each territory, by key; none while `inkNote` says why not */
	inks: Record<string, number>;
	/** why the territories have no inks: 'The territories need 5 inks and the palette has 4.' */
	inkNote: string | null;
	measures: DeskMeasure[];
	textColumns: DeskTextColumn[];
	/** what figures need of every region; see `UnitGeometry` of the territories engine */
	geometry: { at: number[]; outlineMetres: number[] };
	proposals: ProposalNote[];
	handovers: HandoverNote[];
}

/** `POST territories/draft`: 200 */
export interface TerritoriesSaved {
	revision: number;
	savedAt: string;
	document: TerritoryDraft;
	inks: Record<string, number>;
	inkNote: string | null;
	/** territories whose ink differs from the revision before, by key */
	changedInks: string[];
}

/** `POST territories/draft`: 409, somebody else saved first; nothing was overwritten */
export interface TerritoriesStale {
	revision: number;
	savedBy: string | null;
	savedAt: string | null;
	/** what they saved */
	document: TerritoryDraft;
	inks: Record<string, number>;
}

/** Territories made from a column or from scratch, before they are saved. */
export interface TerritoriesPreview {
	document: TerritoryDraft;
	/** regions of each territory, in the order of the list */
	regions: number[];
	/** regions for which the column has no word */
	without: number;
}

/** `GET territories/proposals/status`: those at work, and those that ended in the last minutes. */
export interface ProposalProgress {
	number: number;
	state: ProposalNote['state'];
	step: string;
	share: number;
}

/** `POST territories/proposals/[proposal]/plan`: 200 */
export interface PlanSaved {
	revision: number;
	assignment: number[];
	note: ProposalNote;
	/** ink number of each territory by key, and those that differ from the sheet's now */
	inks: Record<string, number>;
	changedInks: string[];
}

/** `POST territories/proposals/[proposal]/plan`: 409, somebody else edited it first */
export interface PlanStale {
	revision: number;
	assignment: number[];
}

/** One proposal in the list and in the comparison. */
export interface ProposalNote {
	number: number;
	name: string;
	state:
		| 'waiting'
		| 'running'
		| 'kept'
		| 'impossible'
		| 'undecided'
		| 'failed'
		| 'cancelled'
		| 'adopted'
		| 'dropped';
	step: string;
	share: number;
	createdAt: string;
	createdBy: string | null;
	/** what it was asked for, with the tolerances by measure id */
	wishes: Wishes;
	/** counts the edits by hand */
	revision: number;
	/** what it was computed from has changed since */
	stale: string | null;
	/** 'Moved 18, at least 14 needed', or why there is no plan, in one sentence with names */
	sentence: string;
	outcome: ProposalOutcome | null;
}

export interface ProposalOutcome {
	moved: number;
	cost: number;
	compulsoryCost: number;
	lowerBound: number;
	proved: boolean;
	cutBorders: { before: number; after: number };
	/** largest and mean deviation for each measure with a tolerance, by measure id, as shares */
	largest: Record<string, number>;
	mean: Record<string, number>;
	outside: number;
	/** moves nobody chose: a leaver's regions, regions without a territory, torn-off parts */
	compulsory: number;
	/** rules that it breaks after edits by hand, in words: such a plan cannot be adopted */
	faults: string[];
	/** tolerances that it misses, in words: such a plan is adopted only on an explicit yes */
	misses: string[];
	/** with status impossible */
	reason: Impossible['reason'] | null;
	relief: (Relief & { sentence: string })[];
	witness: { regions: number[]; territories: number[] } | null;
}

/** A proposal opened: everything the sheet and the tables show. */
export interface DeskProposal extends ProposalNote {
	/** territory keys in the proposal's own order */
	territoryKeys: string[];
	/** index into `territoryKeys` for every region; null while there is none */
	assignment: number[] | null;
	/** as computed, before edits by hand */
	computed: number[] | null;
	/** territory of every region when it was asked for, as an index into `territoryKeys` or -1 */
	today: number[];
	/** ink number of each territory by key, and those that differ from the sheet's now */
	inks: Record<string, number>;
	changedInks: string[];
}

export interface HandoverNote {
	number: number;
	proposal: { number: number; name: string };
	effectiveOn: string;
	state: 'open' | 'approved' | 'withdrawn';
	stale: string | null;
	moves: number;
	proposed: number;
	accepted: number;
	disputed: number;
	createdAt: string;
	createdBy: string | null;
	approvedAt: string | null;
	approvedBy: string | null;
}

/** One measure table being joined, or joined. */
export interface MeasureTableNote {
	number: number;
	name: string;
	fileName: string;
	state: 'open' | 'taken' | 'replaced' | 'dropped';
	rows: number;
	matched: number;
	confidential: boolean;
	createdAt: string;
	createdBy: string | null;
	takenAt: string | null;
	takenBy: string | null;
	measures: { id: string; name: string; unit: string; kind: 'number' | 'text' }[];
	stale: boolean;
}
