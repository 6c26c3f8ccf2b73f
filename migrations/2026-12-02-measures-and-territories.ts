import { sql, type Kysely } from 'kysely';

/**
 * Figures joined to regions, the territories of a sheet, proposals to even them out, and the lists by
 * which moves are handed over. Long columns are arrays in region order, so that 33,000 regions are a few
 * values to read. Frozen once landed: changes come as new migrations.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		create table measure_tables (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			name text not null check (length(name) between 1 and 200),
			boundary_set_id uuid not null references boundary_sets,
			file_name text not null,
			file_digest text not null,
			file_bytes bigint not null,
			options jsonb not null default '{}',
			source jsonb,
			row_count integer not null default 0,
			matched_count integer not null default 0,
			confidential boolean not null default true,
			state text not null check (state in ('open', 'taken', 'replaced', 'dropped')),
			changes jsonb not null default '{}',
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			taken_by uuid references "User" on delete set null,
			taken_at timestamptz,
			unique (sheet_id, number)
		);
		create index on measure_tables (file_digest);
		create table measures (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			table_id uuid not null references measure_tables on delete cascade,
			position integer not null,
			name text not null check (length(name) between 1 and 200),
			unit text not null default '' check (length(unit) <= 40),
			kind text not null check (kind in ('number', 'text')),
			values double precision[],
			texts text[],
			unique (sheet_id, name),
			check ((kind = 'number') = (values is not null) and (kind = 'text') = (texts is not null))
		);
		create index on measures (table_id);

		alter table sheets add column territory_revision integer not null default 0;
		create table territory_drafts (
			sheet_id uuid not null references sheets on delete cascade,
			revision integer not null,
			document jsonb not null,
			inks jsonb not null default '{}',
			change text not null default 'edited',
			saved_by uuid references "User" on delete set null,
			saved_at timestamptz not null default now(),
			primary key (sheet_id, revision)
		);
		create table proposals (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			name text not null check (length(name) between 1 and 120),
			state text not null check (state in
				('waiting', 'running', 'kept', 'impossible', 'undecided', 'failed', 'cancelled', 'adopted', 'dropped')),
			step text not null default '',
			share double precision not null default 0,
			attempts integer not null default 0,
			claim uuid,
			heard_at timestamptz,
			territory_revision integer not null,
			boundary_set_id uuid not null references boundary_sets,
			data_digest text not null,
			request jsonb not null,
			territory_keys text[] not null,
			assignment integer[],
			computed integer[],
			result jsonb,
			inks jsonb not null default '{}',
			revision integer not null default 0,
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			updated_at timestamptz not null default now(),
			unique (sheet_id, number)
		);
		create index proposals_at_work on proposals (heard_at) where state in ('waiting', 'running');

		create table handovers (
			id uuid primary key default gen_random_uuid(),
			sheet_id uuid not null references sheets on delete cascade,
			number integer not null,
			proposal_id uuid not null references proposals,
			effective_on date not null,
			state text not null check (state in ('open', 'approved', 'withdrawn')),
			data_digest text not null,
			digest text,
			note text not null default '',
			created_by uuid references "User" on delete set null,
			created_at timestamptz not null default now(),
			approved_by uuid references "User" on delete set null,
			approved_at timestamptz,
			unique (sheet_id, number)
		);
		create table handover_moves (
			handover_id uuid not null references handovers on delete cascade,
			ordinal integer not null,
			region_key text not null,
			region_name text not null,
			from_key text,
			from_name text,
			to_key text not null,
			to_name text not null,
			figures jsonb not null default '{}',
			reason text not null default '',
			state text not null check (state in ('proposed', 'accepted', 'disputed', 'approved')),
			word text not null default '',
			changed_by text not null default '',
			changed_at timestamptz not null default now(),
			primary key (handover_id, ordinal),
			check (state <> 'disputed' or word <> '')
		);
		create table handover_letters (
			id uuid primary key default gen_random_uuid(),
			handover_id uuid not null references handovers on delete cascade,
			territory_key text not null,
			email text not null check (email = lower(email)),
			token_hash bytea not null unique,
			with_figures boolean not null default false,
			sent_at timestamptz not null default now(),
			expires_at timestamptz not null,
			answered_at timestamptz,
			revoked_at timestamptz
		);
		create index on handover_letters (handover_id);

		create function refuse_change_after_approval() returns trigger language plpgsql as $$
		begin
			if exists (select 1 from handovers where id = old.handover_id and state = 'approved') then
				raise exception 'an approved handover list does not change';
			end if;
			return new;
		end $$;
		create trigger approved_moves_are_immutable before update on handover_moves
			for each row execute function refuse_change_after_approval();
		create trigger approved_handovers_are_immutable before update on handovers
			for each row when (old.state = 'approved' and (new.effective_on <> old.effective_on
				or new.digest is distinct from old.digest or new.proposal_id <> old.proposal_id))
			execute function refuse_change();
	`.execute(db);
}
