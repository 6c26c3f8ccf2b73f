import { sql, type Kysely } from 'kysely';

/**
 * Longer searches for what the colouring of a draft leaves open. Frozen once landed: changes come as new
 * migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table searches (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			state text not null check (state in
				('waiting', 'running', 'stored', 'kept', 'nothing', 'failed', 'cancelled')),
			question text not null check (question in ('inks', 'answer', 'release')),
			-- so many times the steps of a thorough search
			times integer not null check (times between 1 and 1000),
			-- the draft it is about, and a digest of what that asks
			revision integer not null,
			problem_digest text not null,
			step text not null default '',
			share double precision not null default 0,
			attempts integer not null default 0,
			claim uuid,
			heard_at timestamptz,
			gain text,
			result jsonb,
			-- what came of it, in one sentence
			sentence text not null default '',
			stored_revision integer,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			unique (sheet_id, number)
		);
		create unique index searches_one_open on searches (sheet_id) where state in ('waiting', 'running');
		create index searches_at_work on searches (heard_at) where state in ('waiting', 'running');
		create index searches_open_by_team on searches (team_id) where state in ('waiting', 'running');
	`.execute(db);
}
