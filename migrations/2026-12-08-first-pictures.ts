import { sql, type Kysely } from 'kysely';

/** Coarse pictures that a large sheet shows first. Frozen once landed: changes come as new migrations. */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table first_pictures (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			-- digest of everything else that decides the picture
			tag text not null,
			-- packed with gzip; empty where nothing is drawn
			picture bytea not null,
			made_at timestamptz not null default now(),
			primary key (boundary_set_id, tag)
		);
	`.execute(db);
}
