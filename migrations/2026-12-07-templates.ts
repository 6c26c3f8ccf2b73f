import { sql, type Kysely } from 'kysely';

/** Layouts that a team keeps as patterns. Frozen once landed: changes come as new migrations. */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table layout_templates (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			name text not null check (length(name) between 1 and 120),
			-- field of the layout to its value
			fields jsonb not null,
			-- one to so many, and the palette, where sheets of a series share them
			ratio double precision check (ratio > 0),
			palette jsonb,
			-- grows with every change, so that a change made from an older state is told
			revision integer not null default 1,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now()
		);
		create unique index layout_templates_name on layout_templates (team_id, lower(name));
	`.execute(db);
}
