import type { Generated, JSONColumnType } from 'kysely';
import type { Ink } from '../../engines/palettes/palette.ts';
import type { Moment, OptionalMoment } from './columns.ts';

export type PaletteInk = Ink;

/** Row types of the team's palettes and of their approvals. */
export interface PaletteTable {
	id: Generated<string>;
	team_id: string;
	name: string;
	inks: JSONColumnType<Ink[]>;
	revision: Generated<number>;
	source: string | null;
	licence: string | null;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
}

export interface PaletteApprovalTable {
	id: Generated<string>;
	team_id: string;
	palette_id: string;
	name: string;
	inks: JSONColumnType<Ink[]>;
	digest: string;
	approved_by: string | null;
	approved_at: Moment;
	ended_at: OptionalMoment;
}
