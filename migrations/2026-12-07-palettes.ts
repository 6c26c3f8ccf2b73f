import { sql, type Kysely } from 'kysely';

/**
 * Palettes that are edited, and approvals of them. Frozen once landed: changes come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		alter table palettes
			-- grows with every change, so that a change made from an older state is told
			add column revision integer not null default 1,
			add column updated_at timestamptz not null default now(),
			-- of a copy of a published palette: where its values come from
			add column source text check (length(source) <= 1000),
			add column licence text check (length(licence) <= 400);

		create table palette_approvals (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			palette_id uuid not null references palettes on delete cascade,
			-- the palette as it was approved
			name text not null,
			inks jsonb not null,
			digest text not null check (digest ~ '^[0-9a-f]{64}$'),
			approved_by uuid references "User" on delete set null,
			approved_at timestamptz not null default now(),
			-- when the palette was changed after it, or the approval taken back
			ended_at timestamptz
		);
		create unique index palette_approvals_one_in_force on palette_approvals (palette_id)
			where ended_at is null;
		create index palette_approvals_by_team on palette_approvals (team_id, approved_at);
	`.execute(db);
}
