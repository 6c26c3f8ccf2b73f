import { sql, type Kysely } from 'kysely';

/**
 * Files taken of an edition or of a draft, made by a job and kept by digest. Frozen once landed: changes
 * come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table exports (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			state text not null check (state in ('waiting', 'running', 'done', 'failed', 'cancelled')),
			-- of an edition; null: of a draft
			edition integer,
			-- the draft, or the one that was issued
			revision integer not null,
			kind text not null,
			options jsonb not null,
			reader text not null check (reader in ('typical', 'protan', 'deutan', 'tritan', 'grey')),
			-- what is printed on the sheet about edition and day
			issue text not null,
			-- over everything that decides the bytes
			request_digest text not null,
			file_name text not null,
			step text not null default '',
			share double precision not null default 0,
			attempts integer not null default 0,
			claim uuid,
			heard_at timestamptz,
			file_digest text,
			file_bytes bigint,
			media_type text,
			-- why there is no file, or what whoever takes it should know
			sentence text not null default '',
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			-- null: kept as long as the edition
			expires_at timestamptz,
			unique (sheet_id, number),
			check ((state = 'done') = (file_digest is not null))
		);
		-- the same request is answered once
		create unique index exports_one_each on exports (sheet_id, request_digest)
			where state in ('waiting', 'running', 'done');
		create index exports_at_work on exports (heard_at) where state in ('waiting', 'running');
		create index exports_open_by_team on exports (team_id) where state in ('waiting', 'running');
		create index exports_by_file on exports (file_digest);
		create index exports_by_expiry on exports (expires_at);
	`.execute(db);
}
