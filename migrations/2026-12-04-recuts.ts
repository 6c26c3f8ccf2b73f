import { sql, type Kysely } from 'kysely';

/**
 * What a reader asks and what it was answered, mends offered with findings, the pieces of regions, gaps
 * across water as far as they were measured, simplified geometry for the screen, and re-cuts: changes of a
 * sheet's boundaries that are read, compared, confirmed and can be put back. Frozen once landed: changes
 * come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		alter table intakes drop constraint intakes_state_check;
		alter table intakes add constraint intakes_state_check check (state in
			('waiting', 'reading', 'asking', 'done', 'refused', 'cancelled', 'failed'));
		alter table intakes add column question jsonb;
		alter table intakes add column remembered jsonb;

		create table reading_answers (
			team_id uuid not null references teams on delete cascade,
			about text not null check (about in ('layer', 'crs', 'axes', 'keys', 'columns')),
			likeness text not null check (length(likeness) <= 200),
			options jsonb not null,
			file_name text not null,
			answered_by uuid references "User" on delete set null,
			answered_at timestamptz not null default now(),
			primary key (team_id, about, likeness)
		);

		alter table findings add column offers jsonb;
		alter table boundary_sets add column found jsonb;
		alter table boundary_sets add column options jsonb not null default '{}';
		alter table boundary_sets add column gaps_km double precision not null default 0;

		create table gaps (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			a integer not null,
			b integer not null,
			metres double precision not null,
			at_lon double precision not null,
			at_lat double precision not null,
			primary key (boundary_set_id, a, b),
			check (a < b)
		);
		create table pieces (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			ordinal integer not null,
			region integer not null,
			part integer not null,
			kind text not null check (kind in ('main', 'exclave', 'island')),
			area_km2 double precision not null,
			lon double precision not null,
			lat double precision not null,
			within integer,
			primary key (boundary_set_id, ordinal)
		);
		create table display_levels (
			boundary_set_id uuid not null references boundary_sets on delete cascade,
			level integer not null,
			tolerance_metres double precision not null,
			points integer not null,
			geometry bytea not null,
			primary key (boundary_set_id, level)
		);

		-- the regions that a draft and its colouring are about, for sheets that were given other boundaries
		alter table drafts add column boundary_set_id uuid references boundary_sets;
		update drafts set boundary_set_id = sheets.boundary_set_id from sheets where sheets.id = drafts.sheet_id;
		alter table drafts alter column boundary_set_id set not null;
		create index on drafts (boundary_set_id);

		create table recuts (
			id uuid primary key default gen_random_uuid(),
			team_id uuid not null references teams on delete cascade,
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			kind text not null check (kind in ('file', 'reading', 'mends')),
			state text not null check (state in ('waiting', 'reading', 'asking', 'ready', 'applied', 'put-back',
				'dropped', 'refused', 'cancelled', 'failed')),
			from_set uuid not null references boundary_sets,
			to_set uuid references boundary_sets,
			file_name text not null,
			file_bytes bigint not null,
			file_digest text,
			options jsonb not null default '{}',
			-- what it does, in one sentence
			words text not null,
			step text not null default '',
			share double precision not null default 0,
			attempts integer not null default 0,
			claim uuid,
			heard_at timestamptz,
			question jsonb,
			remembered jsonb,
			refusal jsonb,
			-- pairs gained, lost and changed, findings come and gone
			comparison jsonb,
			-- which region continues as which
			matching jsonb,
			decisions jsonb not null default '[]',
			-- what followed and what did not, once applied
			report jsonb,
			-- draft, territories and figures as they were, to be put back
			before jsonb,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			applied_by uuid references "User" on delete set null,
			applied_at timestamptz,
			put_back_by uuid references "User" on delete set null,
			put_back_at timestamptz,
			unique (sheet_id, number)
		);
		create index intakes_asking on intakes (updated_at) where state = 'asking';
		create index recuts_asking on recuts (updated_at) where state = 'asking';
		create index on recuts (file_digest);
		create index on recuts (from_set);
		create index on recuts (to_set);
		create index recuts_at_work on recuts (heard_at) where state in ('waiting', 'reading');
	`.execute(db);
}
