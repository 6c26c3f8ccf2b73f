import { sql, type Kysely } from 'kysely';

/**
 * The tolerance that would join borders which run apart, with the finding that tells of them, so that the
 * desk can offer to preview it. Frozen once landed: changes come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`alter table findings add column if not exists tolerance_metres double precision`.execute(
		db,
	);
}
