import type { Generated, Insertable, JSONColumnType, Selectable } from 'kysely';
import type { Moment, OptionalMoment, Whole } from './columns.ts';
import type * as exported from './exports-tables.ts';
import type * as palettes from './palette-tables.ts';
import type * as recuts from './recut-tables.ts';
import type * as searches from './search-tables.ts';
import type * as templates from './template-tables.ts';
import type * as territories from './territory-tables.ts';

export type * from './exports-tables.ts';
export type * from './palette-tables.ts';
export type * from './recut-tables.ts';
export type * from './search-tables.ts';
export type * from './template-tables.ts';
export type * from './territory-tables.ts';

/** Row types, one interface a table, kept beside `migrations/`. */
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
	/** what the reader recognised in the file */
	found: JSONColumnType<Record<string, unknown>> | null;
	/** how it was read, mends included, so that it can be read so again */
	options: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	/** how far across water the gaps have been measured */
	gaps_km: Generated<number>;
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
	/** ways to mend it */
	offers: JSONColumnType<unknown[]> | null;
	/** the tolerance in metres that would join the borders it is about */
	tolerance_metres: number | null;
}
export type IntakeState =
	'waiting' | 'reading' | 'asking' | 'done' | 'refused' | 'cancelled' | 'failed';
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
	/** what the reader cannot know, while it asks */
	question: JSONColumnType<Record<string, unknown>> | null;
	/** earlier answers that were taken for this file too */
	remembered: JSONColumnType<unknown[]> | null;
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
	/** the regions it is about: an earlier draft may be of earlier boundaries */
	boundary_set_id: string;
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
	palettes: palettes.PaletteTable;
	palette_approvals: palettes.PaletteApprovalTable;
	sheets: SheetTable;
	colourings: ColouringTable;
	drafts: DraftTable;
	editions: EditionTable;
	edition_files: EditionFileTable;
	measure_tables: territories.MeasureTableTable;
	measures: territories.MeasureRowTable;
	territory_drafts: territories.TerritoryDraftTable;
	proposals: territories.ProposalTable;
	handovers: territories.HandoverTable;
	handover_moves: territories.HandoverMoveTable;
	handover_letters: territories.HandoverLetterTable;
	handover_answers: territories.HandoverAnswerTable;
	reading_answers: recuts.ReadingAnswerTable;
	gaps: recuts.GapTable;
	pieces: recuts.PieceTable;
	display_levels: recuts.DisplayLevelTable;
	first_pictures: recuts.FirstPictureTable;
	recuts: recuts.RecutTable;
	searches: searches.SearchTable;
	exports: exported.ExportTable;
	layout_templates: templates.LayoutTemplateTable;
}

export type Row<T extends keyof Database> = Selectable<Database[T]>;
export type NewRow<T extends keyof Database> = Insertable<Database[T]>;
