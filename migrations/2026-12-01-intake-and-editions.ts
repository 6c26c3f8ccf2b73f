import { sql, type Kysely } from 'kysely';

/**
 * What the first run of the whole chain asked for: who holds an intake and since when it was last
 * heard of (so that a dead worker's intake is taken up again, and only once), why a set of boundaries
 * is not planar, and which draft an edition was issued from.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		alter table intakes add column claim uuid;
		alter table intakes add column heard_at timestamptz;
		create index intakes_at_work on intakes (heard_at) where state in ('waiting', 'reading');
		alter table boundary_sets add column planar_witness jsonb;
		alter table editions add column revision integer not null default 0;
		create index on boundary_sets (file_digest);
		create index on intakes (file_digest);
		create index on edition_files (digest);
		create index on sheets (boundary_set_id);
	`.execute(db);
}
