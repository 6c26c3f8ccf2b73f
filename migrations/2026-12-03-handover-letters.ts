import { sql, type Kysely } from 'kysely';

/**
 * What handing over asked for once it was done by hand: which measures a list shows, what it was made
 * from in parts (so that it can be told what changed), letters that failed to go out or are sent again,
 * and every answer with its author. Nothing of an approved list changes, rows come or go included.
 */
export async function up(db: Kysely<unknown>): Promise<void> {
	await sql`
		alter table handovers
			add column measures jsonb not null default '[]',
			add column data_parts jsonb not null default '{}';

		alter table handover_letters
			alter column sent_at drop not null,
			alter column sent_at drop default,
			add column created_at timestamptz not null default now(),
			add column created_by uuid references "User" on delete set null,
			add column failure text,
			add column press uuid not null default gen_random_uuid();
		alter table handover_letters add unique (handover_id, territory_key, press);

		create table handover_answers (
			id bigint generated always as identity primary key,
			handover_id uuid not null references handovers on delete cascade,
			ordinal integer not null,
			territory_key text,
			answer text not null check (answer in ('proposed', 'accepted', 'disputed')),
			word text not null default '' check (length(word) <= 2000),
			author text not null,
			at timestamptz not null default now(),
			foreign key (handover_id, ordinal) references handover_moves on delete cascade,
			check (answer <> 'disputed' or word <> '')
		);
		create index on handover_answers (handover_id, ordinal);

		create function refuse_change_of_approved_list() returns trigger language plpgsql as $$
		begin
			if exists (select 1 from handovers where state = 'approved'
				and id = case when tg_op = 'INSERT' then new.handover_id else old.handover_id end) then
				raise exception 'an approved handover list does not change';
			end if;
			return case when tg_op = 'DELETE' then old else new end;
		end $$;
		create trigger approved_moves_stay before insert or delete on handover_moves
			for each row execute function refuse_change_of_approved_list();
		create trigger approved_answers_stay before insert or update or delete on handover_answers
			for each row execute function refuse_change_of_approved_list();
		create trigger approved_handovers_stay before update on handovers
			for each row when (old.state = 'approved' and (new.state <> old.state
				or new.number <> old.number or new.sheet_id <> old.sheet_id or new.note <> old.note
				or new.data_digest <> old.data_digest or new.measures <> old.measures
				or new.approved_at is distinct from old.approved_at))
			execute function refuse_change();
	`.execute(db);
}
