import type { ColumnType, Generated, Insertable, JSONColumnType, Selectable } from 'kysely';

/** Row types, one interface a table, kept beside `migrations/`. */
type Moment = ColumnType<Date, Date | string | undefined, Date | string>;
type OptionalMoment = ColumnType<
	Date | null,
	Date | string | null | undefined,
	Date | string | null
>;
/** bigint columns arrive as numbers: the connection installs the parser */
type Whole = ColumnType<number, number, number>;

export interface UserTable {
	id: Generated<string>;
	name: string | null;
	email: string;
	emailVerified: OptionalMoment;
	image: string | null;
}
export interface AccountTable {
	id: Generated<string>;
	userId: string;
	type: string;
	provider: string;
	providerAccountId: string;
	refresh_token: string | null;
	access_token: string | null;
	expires_at: Whole | null;
	token_type: string | null;
	scope: string | null;
	id_token: string | null;
	session_state: string | null;
}
export interface SessionTable {
	id: Generated<string>;
	userId: string;
	sessionToken: string;
	expires: Moment;
	created_at: Moment;
}
export interface VerificationTokenTable {
	identifier: string;
	token: string;
	expires: Moment;
}
export interface PasswordTable {
	user_id: string;
	hash: string;
	changed_at: Moment;
}
export interface TeamTable {
	id: Generated<string>;
	slug: string;
	name: string;
	created_at: Moment;
}
export interface MemberTable {
	team_id: string;
	user_id: string;
	roles: string[];
	joined_at: Moment;
}
export interface InvitationTable {
	id: Generated<string>;
	team_id: string;
	email: string;
	roles: string[];
	token_hash: Buffer;
	invited_by: string | null;
	created_at: Moment;
	expires_at: Moment;
	accepted_at: OptionalMoment;
	revoked_at: OptionalMoment;
}
export interface ApiTokenTable {
	id: Generated<string>;
	team_id: string;
	name: string;
	hash: Buffer;
	hint: string;
	scopes: string[];
	created_by: string | null;
	created_at: Moment;
	expires_at: Moment;
	revoked_at: OptionalMoment;
	last_used_at: OptionalMoment;
}
export interface ActivityTable {
	id: Generated<number>;
	team_id: string | null;
	at: Moment;
	user_id: string | null;
	token_id: string | null;
	action: string;
	subject_kind: string | null;
	subject_id: string | null;
	detail: JSONColumnType<Record<string, unknown>, string | undefined, string>;
}
export interface RateLimitTable {
	key: string;
	window_start: Moment;
	hits: number;
}
export interface WorkerHeartbeatTable {
	id: string;
	started_at: Moment;
	seen_at: Moment;
}
export interface BoundarySetTable {
	id: Generated<string>;
	team_id: string;
	file_name: string;
	file_digest: string;
	file_bytes: Whole;
	source: JSONColumnType<Record<string, unknown>>;
	columns: string[];
	region_count: number;
	geometry: Buffer;
	planar: boolean;
	planar_witness: JSONColumnType<Record<string, unknown>> | null;
	created_by: string | null;
	created_at: Moment;
}
export interface RegionTable {
	boundary_set_id: string;
	ordinal: number;
	key: string;
	name: string;
	parts: number;
	area_km2: number;
	enclave_of: number | null;
	attributes: JSONColumnType<Record<string, string | number | boolean | null>>;
}
export interface BorderTable {
	boundary_set_id: string;
	a: number;
	b: number;
	kind: string;
	metres: number;
	at_lon: number;
	at_lat: number;
}
export interface FindingTable {
	id: Generated<number>;
	boundary_set_id: string;
	code: string;
	severity: 'error' | 'warning' | 'note';
	message: string;
	regions: string[];
	lon: number | null;
	lat: number | null;
	accepted_by: string | null;
	accepted_at: OptionalMoment;
}
export type IntakeState = 'waiting' | 'reading' | 'done' | 'refused' | 'cancelled' | 'failed';
export interface IntakeTable {
	id: Generated<string>;
	team_id: string;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
	file_name: string;
	file_bytes: Whole;
	file_digest: string | null;
	sheet_name: string;
	options: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	state: IntakeState;
	step: Generated<string>;
	share: Generated<number>;
	refusal: JSONColumnType<Record<string, unknown>> | null;
	attempts: Generated<number>;
	/** who reads it now: renewed at every take-up, so that a late answer of an earlier one is dropped */
	claim: string | null;
	heard_at: OptionalMoment;
	boundary_set_id: string | null;
	sheet_id: string | null;
}
export interface PaletteTable {
	id: Generated<string>;
	team_id: string;
	name: string;
	inks: JSONColumnType<{ name: string; hex: string }[]>;
	created_by: string | null;
	created_at: Moment;
}
export interface SheetTable {
	id: Generated<string>;
	team_id: string;
	number: number;
	name: string;
	boundary_set_id: string;
	revision: Generated<number>;
	/** of its territories; 0 while it has none */
	territory_revision: Generated<number>;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
}
export interface ColouringTable {
	id: Generated<string>;
	sheet_id: string;
	inks: number[];
	inks_used: number;
	lower_bound: number;
	proof: JSONColumnType<Record<string, unknown>>;
	created_at: Moment;
}
export interface DraftTable {
	sheet_id: string;
	revision: number;
	document: JSONColumnType<Record<string, unknown>>;
	colouring_id: string | null;
	explanation: JSONColumnType<Record<string, unknown>> | null;
	saved_by: string | null;
	saved_at: Moment;
}
export interface EditionTable {
	id: Generated<string>;
	sheet_id: string;
	number: number;
	digest: string;
	content: JSONColumnType<Record<string, unknown>>;
	/** the draft it was issued from */
	revision: Generated<number>;
	note: Generated<string>;
	issued_by: string | null;
	issued_at: Moment;
}
export interface EditionFileTable {
	edition_id: string;
	name: string;
	media_type: string;
	digest: string;
	bytes: Whole;
}

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

export interface Database {
	User: UserTable;
	Account: AccountTable;
	Session: SessionTable;
	VerificationToken: VerificationTokenTable;
	passwords: PasswordTable;
	teams: TeamTable;
	members: MemberTable;
	invitations: InvitationTable;
	api_tokens: ApiTokenTable;
	activity: ActivityTable;
	rate_limits: RateLimitTable;
	worker_heartbeats: WorkerHeartbeatTable;
	boundary_sets: BoundarySetTable;
	regions: RegionTable;
	borders: BorderTable;
	findings: FindingTable;
	intakes: IntakeTable;
	palettes: PaletteTable;
	sheets: SheetTable;
	colourings: ColouringTable;
	drafts: DraftTable;
	editions: EditionTable;
	edition_files: EditionFileTable;
	measure_tables: MeasureTableTable;
	measures: MeasureRowTable;
	territory_drafts: TerritoryDraftTable;
	proposals: ProposalTable;
	handovers: HandoverTable;
	handover_moves: HandoverMoveTable;
	handover_letters: HandoverLetterTable;
	handover_answers: HandoverAnswerTable;
}

export type Row<T extends keyof Database> = Selectable<Database[T]>;
export type NewRow<T extends keyof Database> = Insertable<Database[T]>;
