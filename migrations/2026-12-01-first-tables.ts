import { sql, type Kysely } from 'kysely';

/**
 * The tables of the main job. The four quoted, camel-cased tables at the top are named and shaped by
 * Auth.js' Kysely adapter; all others are ours. Frozen once landed: changes come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table "User" (
			id uuid primary key default gen_random_uuid(),
			name text,
			email text not null unique check (email = lower(email)),
			"emailVerified" timestamptz,
			image text
		);
		create table "Account" (
			id uuid primary key default gen_random_uuid(),
			"userId" uuid not null references "User" on delete cascade,
			type text not null,
			provider text not null,
			"providerAccountId" text not null,
			refresh_token text,
			access_token text,
			expires_at bigint,
			token_type text,
			scope text,
			id_token text,
			session_state text,
			unique (provider, "providerAccountId")
		);
		create table "Session" (
			id uuid primary key default gen_random_uuid(),
			"userId" uuid not null references "User" on delete cascade,
			"sessionToken" text not null unique,
			expires timestamptz not null,
			created_at timestamptz not null default now()
		);
		create table "VerificationToken" (
			identifier text not null,
			token text not null unique,
			expires timestamptz not null,
			primary key (identifier, token)
		);
		create index on "Account" ("userId");
		create index on "Session" ("userId");

		create table passwords (
			user_id uuid primary key references "User" on delete cascade,
			hash text not null,
			changed_at timestamptz not null default now()
		);

		create table teams (
			id uuid primary key default gen_random_uuid(),
			slug text not null unique check (slug ~ '^[a-z0-9][a-z0-9-]{1,48}$'),
			name text not null check (length(name) between 1 and 120),
			created_at timestamptz not null default now()
		);
		create table members (
			team_id uuid not null references teams on delete cascade,
			user_id uuid not null references "User" on delete cascade,
			roles text[] not null check (cardinality(roles) > 0),
			joined_at timestamptz not null default now(),
			primary key (team_id, user_id)
		);
		create index on members (user_id);
		create table invitations (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			email text not null check (email = lower(email)),
			roles text[] not null check (cardinality(roles) > 0),
			token_hash bytea not null unique,
			invited_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			expires_at timestamptz not null,
			accepted_at timestamptz,
			revoked_at timestamptz
		);
		create index on invitations (team_id);
		create table api_tokens (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			name text not null,
			hash bytea not null unique,
			hint text not null,
			scopes text[] not null,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			expires_at timestamptz not null,
			revoked_at timestamptz,
			last_used_at timestamptz
		);
		create index on api_tokens (team_id);
		create table activity (
			id bigint generated always as identity primary key,
			team_id uuid references teams on delete cascade,
			at timestamptz not null default now(),
			user_id uuid references "User" on delete set null,
			token_id uuid references api_tokens on delete set null,
			action text not null,
			subject_kind text,
			subject_id text,
			detail jsonb not null default '{}'
		);
		create index on activity (team_id, id desc);
		create table rate_limits (
			key text not null,
			window_start timestamptz not null,
			hits integer not null,
			primary key (key, window_start)
		);
		create table worker_heartbeats (
			id uuid primary key,
			started_at timestamptz not null default now(),
			seen_at timestamptz not null default now()
		);

		create table boundary_sets (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			file_name text not null,
			file_digest text not null,
			file_bytes bigint not null,
			source jsonb not null,
			columns text[] not null,
			region_count integer not null,
			geometry bytea not null,
			planar boolean not null,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now()
		);
		create index on boundary_sets (team_id);
		create table regions (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			ordinal integer not null,
			key text not null,
			name text not null,
			parts integer not null,
			area_km2 double precision not null,
			enclave_of integer,
			attributes jsonb not null,
			primary key (boundary_set_id, ordinal),
			unique (boundary_set_id, key)
		);
		create table borders (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			a integer not null,
			b integer not null,
			kind text not null check (kind in ('line', 'point', 'water', 'hand')),
			metres double precision not null,
			at_lon double precision not null,
			at_lat double precision not null,
			primary key (boundary_set_id, a, b),
			check (a < b)
		);
		create table findings (
			id bigint generated always as identity primary key,
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			code text not null,
			severity text not null check (severity in ('error', 'warning', 'note')),
			message text not null,
			regions text[] not null,
			lon double precision,
			lat double precision,
			accepted_by uuid references "User" on delete set null,
			accepted_at timestamptz
		);
		create index on findings (boundary_set_id);

		create table intakes (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			file_name text not null,
			file_bytes bigint not null,
			file_digest text,
			sheet_name text not null,
			options jsonb not null default '{}',
			state text not null check (state in ('waiting', 'reading', 'done', 'refused', 'cancelled', 'failed')),
			step text not null default '',
			share double precision not null default 0,
			refusal jsonb,
			attempts integer not null default 0,
			boundary_set_id uuid references boundary_sets on delete set null,
			sheet_id uuid
		);
		create index on intakes (team_id, created_at desc);

		create table palettes (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			name text not null check (length(name) between 1 and 120),
			inks jsonb not null,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			unique (team_id, name)
		);

		create table sheets (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			number integer not null,
			name text not null check (length(name) between 1 and 200),
			boundary_set_id uuid not null references boundary_sets,
			revision integer not null default 0,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			unique (team_id, number)
		);
		alter table intakes add foreign key (sheet_id) references sheets on delete set null;
		create table colourings (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			inks smallint[] not null,
			inks_used smallint not null,
			lower_bound smallint not null,
			proof jsonb not null,
			created_at timestamptz not null default now()
		);
		create index on colourings (sheet_id);
		create table drafts (
			sheet_id uuid not null references sheets on delete cascade,
			revision integer not null,
			document jsonb not null,
			colouring_id uuid references colourings,
			explanation jsonb,
			saved_by uuid references "User" on delete set null,
			saved_at timestamptz not null default now(),
			primary key (sheet_id, revision)
		);
		create table editions (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			digest text not null,
			content jsonb not null,
			note text not null default '',
			issued_by uuid references "User" on delete set null,
			issued_at timestamptz not null default now(),
			unique (sheet_id, number)
		);
		create table edition_files (
			edition_id uuid not null references editions on delete cascade,
			name text not null,
			media_type text not null,
			digest text not null,
			bytes bigint not null,
			primary key (edition_id, name)
		);

		create function refuse_change() returns trigger language plpgsql as $$
		begin
			raise exception 'an issued edition does not change';
		end $$;
		create trigger editions_are_immutable before update on editions
			for each row when (old.content is distinct from new.content or old.digest is distinct from new.digest
				or old.number is distinct from new.number) execute function refuse_change();
		create trigger edition_files_are_immutable before update on edition_files
			for each row execute function refuse_change();
	`.execute(db);
}
