import type { ColumnType, Generated } from 'kysely';
import type { ExportKindId } from '../../engines/exports/index.ts';
import type { Reader } from '../../engines/palettes/index.ts';
import type { ExportState } from '../../schemas/export.ts';
import type { Moment, OptionalMoment } from './columns.ts';

/** Row type of files taken of an edition or a draft. */
export interface ExportTable {
	id: Generated<string>;
	team_id: string;
	sheet_id: string;
	number: number;
	state: ExportState;
	/** null: of a draft */
	edition: number | null;
	/** the draft, or the one that was issued */
	revision: number;
	kind: ExportKindId;
	/** only those that this kind has, each of them said */
	options: ColumnType<Record<string, unknown>, string, string>;
	reader: Reader;
	/** what is printed on the sheet about edition and day */
	issue: string;
	/** over everything that decides the bytes */
	request_digest: string;
	file_name: string;
	step: Generated<string>;
	share: Generated<number>;
	attempts: Generated<number>;
	claim: string | null;
	heard_at: OptionalMoment;
	file_digest: string | null;
	file_bytes: number | null;
	media_type: string | null;
	/** why there is no file, or what whoever takes it should know */
	sentence: Generated<string>;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
	/** null: kept as long as the edition */
	expires_at: OptionalMoment;
}
