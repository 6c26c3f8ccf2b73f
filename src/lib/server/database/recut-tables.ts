import type { Generated, JSONColumnType } from 'kysely';
import type { Moment, OptionalMoment, Whole } from './columns.ts';

/** Row types of what belongs to a boundary set beside regions and borders, and of re-cuts. */

export type AnswerAbout = 'layer' | 'crs' | 'axes' | 'keys' | 'columns';
export interface ReadingAnswerTable {
	team_id: string;
	about: AnswerAbout;
	/** of the question, or of what was found in the file */
	likeness: string;
	options: JSONColumnType<Record<string, unknown>>;
	/** the file that was being read when it was answered */
	file_name: string;
	answered_by: string | null;
	answered_at: Moment;
}
export interface GapTable {
	boundary_set_id: string;
	a: number;
	b: number;
	metres: number;
	at_lon: number;
	at_lat: number;
}
export interface PieceTable {
	boundary_set_id: string;
	ordinal: number;
	region: number;
	part: number;
	kind: 'main' | 'exclave' | 'island';
	area_km2: number;
	lon: number;
	lat: number;
	within: number | null;
}
export interface DisplayLevelTable {
	boundary_set_id: string;
	/** 1 is the coarsest */
	level: number;
	tolerance_metres: number;
	points: number;
	geometry: Buffer;
}

export interface FirstPictureTable {
	boundary_set_id: string;
	/** of everything else that decides the picture */
	tag: string;
	/** packed with gzip; empty where nothing is drawn */
	picture: Buffer;
	made_at: Moment;
}

export type RecutKind = 'file' | 'reading' | 'mends';
export type RecutState =
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
export interface RecutTable {
	id: Generated<string>;
	team_id: string;
	sheet_id: string;
	number: number;
	kind: RecutKind;
	state: RecutState;
	from_set: string;
	to_set: string | null;
	file_name: string;
	file_bytes: Whole;
	file_digest: string | null;
	options: JSONColumnType<Record<string, unknown>, string | undefined, string>;
	words: string;
	step: Generated<string>;
	share: Generated<number>;
	attempts: Generated<number>;
	claim: string | null;
	heard_at: OptionalMoment;
	question: JSONColumnType<Record<string, unknown>> | null;
	remembered: JSONColumnType<unknown[]> | null;
	refusal: JSONColumnType<Record<string, unknown>> | null;
	comparison: JSONColumnType<Record<string, unknown>> | null;
	matching: JSONColumnType<Record<string, unknown>> | null;
	decisions: JSONColumnType<unknown[], string | undefined, string>;
	report: JSONColumnType<unknown[]> | null;
	before: JSONColumnType<Record<string, unknown>> | null;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
	applied_by: string | null;
	applied_at: OptionalMoment;
	put_back_by: string | null;
	put_back_at: OptionalMoment;
}
