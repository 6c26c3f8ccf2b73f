import type { Generated, JSONColumnType } from 'kysely';
import type { Moment, OptionalMoment, Whole } from './columns.ts';

/** Row types of measures, territories, proposals and handover lists. */

export type MeasureTableState = 'open' | 'taken' | 'replaced' | 'dropped';
export interface MeasureTableTable {
	id: Generated<string>;
	sheet_id: string;
	number: number;
	name: string;
	boundary_set_id: string;
	file_name: string;
	file_digest: string;
	file_bytes: Whole;
	options: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	source: JSONColumnType<Record<string, unknown>> | null;
	row_count: Generated<number>;
	matched_count: Generated<number>;
	confidential: Generated<boolean>;
	state: MeasureTableState;
	changes: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	created_by: string | null;
	created_at: Moment;
	taken_by: string | null;
	taken_at: OptionalMoment;
}
export interface MeasureRowTable {
	id: Generated<string>;
	sheet_id: string;
	table_id: string;
	position: number;
	name: string;
	unit: Generated<string>;
	kind: 'number' | 'text';
	/** one a region, in region order; null where it is missing */
	values: (number | null)[] | null;
	texts: (string | null)[] | null;
}
export interface TerritoryDraftTable {
	sheet_id: string;
	revision: number;
	document: JSONColumnType<Record<string, unknown>>;
	/** ink number of each territory, by key */
	inks: JSONColumnType<Record<string, number>, string | undefined, string>;
	/** what it came from: edited, or a proposal that was adopted */
	change: Generated<string>;
	saved_by: string | null;
	saved_at: Moment;
}
export type ProposalState =
	| 'waiting'
	| 'running'
	| 'kept'
	| 'impossible'
	| 'undecided'
	| 'failed'
	| 'cancelled'
	| 'adopted'
	| 'dropped';
export interface ProposalTable {
	id: Generated<string>;
	sheet_id: string;
	number: number;
	name: string;
	state: ProposalState;
	step: Generated<string>;
	share: Generated<number>;
	attempts: Generated<number>;
	claim: string | null;
	heard_at: OptionalMoment;
	/** the territory draft it starts from */
	territory_revision: number;
	boundary_set_id: string;
	/** of everything it was computed from: stale once that differs */
	data_digest: string;
	request: JSONColumnType<Record<string, unknown>>;
	territory_keys: string[];
	/** index into `territory_keys` of every region; after edits by hand */
	assignment: number[] | null;
	/** as the engine left it */
	computed: number[] | null;
	result: JSONColumnType<Record<string, unknown>> | null;
	inks: JSONColumnType<Record<string, number>, string | undefined, string>;
	/** counts the edits by hand */
	revision: Generated<number>;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
}
export interface HandoverTable {
	id: Generated<string>;
	sheet_id: string;
	number: number;
	proposal_id: string;
	/** YYYY-MM-DD */
	effective_on: string;
	state: 'open' | 'approved' | 'withdrawn';
	data_digest: string;
	/** what `data_digest` is over, kept apart so that it can be told what changed */
	data_parts: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	/** the measures whose figures the moves carry */
	measures: JSONColumnType<
		{ name: string; unit: string; confidential: boolean }[],
		string | undefined,
		string
	>;
	/** SHA-256 of the list as approved */
	digest: string | null;
	note: Generated<string>;
	created_by: string | null;
	created_at: Moment;
	approved_by: string | null;
	approved_at: OptionalMoment;
}
export type MoveState = 'proposed' | 'accepted' | 'disputed' | 'approved';
export interface HandoverMoveTable {
	handover_id: string;
	ordinal: number;
	region_key: string;
	region_name: string;
	from_key: string | null;
	from_name: string | null;
	to_key: string;
	to_name: string;
	/** value of each measure by its name */
	figures: JSONColumnType<Record<string, number>, string | undefined, string>;
	reason: Generated<string>;
	state: MoveState;
	word: Generated<string>;
	/** name of who gave the state */
	changed_by: Generated<string>;
	changed_at: Moment;
}
export interface HandoverLetterTable {
	id: Generated<string>;
	handover_id: string;
	territory_key: string;
	email: string;
	token_hash: Buffer;
	with_figures: Generated<boolean>;
	/** null while it is on its way, or when it could not be sent */
	sent_at: OptionalMoment;
	expires_at: Moment;
	answered_at: OptionalMoment;
	revoked_at: OptionalMoment;
	created_at: Moment;
	created_by: string | null;
	/** why it could not be sent */
	failure: string | null;
	/** the press of the button that asked for it: the same press sends no second letter */
	press: Generated<string>;
}
export interface HandoverAnswerTable {
	id: Generated<number>;
	handover_id: string;
	ordinal: number;
	/** whose letter it came by; null for a planner */
	territory_key: string | null;
	answer: Exclude<MoveState, 'approved'>;
	word: Generated<string>;
	/** address of the letter, or the planner's name */
	author: string;
	at: Moment;
}
