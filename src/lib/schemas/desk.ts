import type { BorderList } from '../engines/borders/border-list.ts';
import type { Finding } from '../engines/boundaries/finding.ts';
import type { Mend } from '../engines/boundaries/mends/mend.ts';
import type { Found, Question } from '../engines/boundaries/question.ts';
import type { Explanation, Proof } from '../engines/colouring/problem.ts';
import type { Draft } from '../engines/editions/draft.ts';
import type { Action } from '../server/access/roles.ts';
import type { DeskTheme } from './desk-theme.ts';
import type { ReadingFields } from './upload.ts';

/**
 * What a sheet's pages are given by the server. Regions and inks are numbered from 0 in the order of
 * the boundary set; long lists are columns, so that 33,000 regions travel as a few arrays.
 */
export interface DeskSheet {
	id: string;
	/** the number in the sheet's address, counted within the team */
	number: number;
	name: string;
	/** of the draft that is shown; sent back with every save */
	revision: number;
	savedBy: string | null;
	/** ISO 8601 */
	savedAt: string;
	boundarySet: DeskBoundarySet;
	draft: Draft;
	colouring: DeskColouring | null;
	/** ink of each region in the last colouring that kept every rule of its draft; null before the first */
	lastInks: number[] | null;
	regions: DeskRegions;
	borders: BorderList;
	findings: DeskFinding[];
	/** newest first */
	editions: DeskEdition[];
	/** figures joined to the regions, and tables under review; null for whoever may not see them */
	measures: { count: number; missing: number; stale: number; open: number } | null;
	/** the classes that the draft shows in place of its colouring; null for none */
	theme: DeskTheme | null;
	/** what the one who looks may do here */
	rights: Action[];
}

/** A large sheet as its page is given it; regions and borders follow from `GET sheets/[sheet]/columns`. */
export interface DeskSheetApart extends Omit<
	DeskSheet,
	'regions' | 'borders' | 'colouring' | 'lastInks' | 'theme'
> {
	regions: null;
	borders: null;
	borderCount: number;
	/** names of the level above, and which of them each region has; null where no column is chosen */
	group: { names: (string | null)[]; of: PackedNumbers } | null;
	/** one that stands has the inks of `lastInks` */
	colouring:
		| Omit<Extract<DeskColouring, { status: 'coloured' }>, 'inks'>
		| Exclude<DeskColouring, { status: 'coloured' }>
		| null;
	lastInks: PackedNumbers | null;
	theme: (Omit<DeskTheme, 'classes'> & { classes: PackedNumbers }) | null;
	/** tag of the picture that is shown first: `GET sheets/[sheet]/first-picture?tag=` */
	firstPicture: string;
}

/** From `packNumbers`. */
export type PackedNumbers = string;

export interface DeskBoundarySet {
	id: string;
	fileName: string;
	regionCount: number;
	/** about the graph of the line borders */
	planar: boolean;
	/** why not, when it is not */
	planarWitness: PlanarWitness | null;
	source: SourceNote;
	columns: string[];
	/** what was recognised in the file; null for sets read before it was kept */
	found: Found | null;
	/** the mends that were replayed when it was read */
	mends: Mend[];
	/** how it was read otherwise; what is absent was decided from the file */
	options: ReadingFields;
	/** how far across water the gaps have been measured, in kilometres */
	gapsKm: number;
	/** geometry thinned for the screen, coarsest first; none where the full geometry is small or older */
	levels: DisplayLevelNote[];
}

/** `GET sheets/[sheet]/geometry?level=n`; 1 is the coarsest. */
export interface DisplayLevelNote {
	level: number;
	/** detail smaller than a square with sides as long as this is left out */
	toleranceMetres: number;
	points: number;
}

/** Regions that no plane drawing can join as their borders do: `paths` run from hub to hub. */
export interface PlanarWitness {
	kind: 'K5' | 'K3,3';
	hubs: number[];
	paths: number[][];
	/** every region on it */
	regions: number[];
	/**
	 * What would have to go for the borders to be planar, nothing of it to spare: regions of which each part
	 * would be one of its own, and pairs that share no line. Null when not worked out; absent in older sets.
	 */
	split?: { regions: number[]; pairs: [number, number][] } | null;
	sentence: string;
}

/** How the file was understood. */
export interface SourceNote {
	format: string;
	layer: string | null;
	crs: string;
	encoding: string | null;
	features: number;
	toleranceMetres: number;
}

/** One entry a region in each column. */
export interface DeskRegions {
	key: string[];
	name: string[];
	parts: number[];
	areaKm2: number[];
	/** the region that surrounds every part of this one, or -1 */
	enclaveOf: number[];
	/** value of the draft's group column, null where there is none */
	group: (string | null)[];
}

export type DeskColouring =
	| {
			status: 'coloured';
			/** ink of each region */
			inks: number[];
			inksUsed: number;
			lowerBound: number;
			proof: Proof;
			/** why no fewer inks do, in one sentence */
			sentence: string;
	  }
	| { status: 'impossible'; explanation: Explanation; sentence: string }
	| { status: 'undecided'; lowerBound: number; message: string; sentence: string };

export interface DeskFinding extends Finding {
	id: number;
	acceptedBy: string | null;
	acceptedAt: string | null;
}

export interface DeskEdition {
	number: number;
	issuedAt: string;
	issuedBy: string | null;
	digest: string;
	note: string;
	files: { name: string; mediaType: string; bytes: number }[];
}

/** `GET sheets/[sheet]/editions/[number]/inks` and `drafts/[revision]/inks`: ink of each region by key */
export interface EarlierInks {
	inks: Record<string, number>;
}

/** `POST sheets/[sheet]/draft`: 200 */
export interface DraftSaved {
	revision: number;
	savedAt: string;
	/** as stored: new locks carry who set them and when */
	document: Draft;
	colouring: DeskColouring;
}

/** `POST sheets/[sheet]/draft`: 409, somebody else saved first; nothing was overwritten */
export interface DraftStale {
	revision: number;
	savedBy: string | null;
	savedAt: string;
	/** what they saved */
	document: Draft;
	/** the regions that it is about: others than before when the boundaries were replaced */
	boundarySetId: string;
}

/** `GET sheets`, one row of the list */
export interface SheetRow {
	number: number;
	name: string;
	regionCount: number;
	openFindings: number;
	/** null while the locks collide or nothing is coloured */
	inksUsed: number | null;
	lastEdition: number | null;
	savedAt: string;
	savedBy: string | null;
}

/** `GET intakes/[intake]/status` and the intake page */
export interface IntakeStatus {
	id: string;
	fileName: string;
	fileBytes: number;
	sheetName: string;
	state: 'waiting' | 'reading' | 'asking' | 'done' | 'refused' | 'cancelled' | 'failed';
	/** what is being done, in words */
	step: string;
	/** 0 to 1 */
	share: number;
	attempts: number;
	createdAt: string;
	createdBy: string | null;
	/** when refused or failed: why and where */
	refusal: { code: string; message: string; findings: Finding[] } | null;
	/** number of the sheet, when done */
	sheet: number | null;
	/** what the reader cannot know, while the state is `asking` */
	question: Question | null;
	/** earlier answers that were taken for this file too */
	remembered: RememberedAnswer[];
}

export type AnswerAbout = 'layer' | 'crs' | 'axes' | 'keys' | 'columns';

/** What a member of the team answered about a file that looked the same. */
export interface RememberedAnswer {
	about: AnswerAbout;
	/** what was answered, in words: `EPSG:25832`, `layer districts` */
	words: string;
	fileName: string;
	answeredBy: string | null;
	answeredAt: string;
}

/** An answer in the team's list, where it can be forgotten. */
export interface RememberedRow extends RememberedAnswer {
	/** names it together with `about` */
	likeness: string;
}
