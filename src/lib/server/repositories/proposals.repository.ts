import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow, ProposalState, Row } from '../database/schema.ts';

/** Makes the next proposal of a sheet, which the caller holds. */
export const insertProposal = (trx: Db, proposal: Omit<NewRow<'proposals'>, 'number'>) =>
	trx
		.insertInto('proposals')
		.values(({ selectFrom }) => ({
			...proposal,
			number: selectFrom('proposals')
				.where('sheet_id', '=', proposal.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();

const withNames = (db: Db) =>
	db
		.selectFrom('proposals')
		.leftJoin('User', 'User.id', 'proposals.created_by')
		.selectAll('proposals')
		.select(['User.name as by_name', 'User.email as by_email']);

/** A proposal that was not dropped. */
export const findProposal = (db: Db, sheetId: string, number: number) =>
	withNames(db)
		.where('proposals.sheet_id', '=', sheetId)
		.where('proposals.number', '=', number)
		.where('proposals.state', '!=', 'dropped')
		.executeTakeFirst();
export type ProposalRow = NonNullable<Awaited<ReturnType<typeof findProposal>>>;

/** The same, held against every other change until the transaction ends. */
export const holdProposal = (trx: Db, sheetId: string, number: number) =>
	trx
		.selectFrom('proposals')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.where('state', '!=', 'dropped')
		.forUpdate()
		.executeTakeFirst();

/** A proposal without its long columns. */
export type ProposalNoteRow = Omit<ProposalRow, 'assignment' | 'computed'>;

const noteColumns = [
	'proposals.id',
	'proposals.sheet_id',
	'proposals.number',
	'proposals.name',
	'proposals.state',
	'proposals.step',
	'proposals.share',
	'proposals.attempts',
	'proposals.claim',
	'proposals.heard_at',
	'proposals.territory_revision',
	'proposals.boundary_set_id',
	'proposals.data_digest',
	'proposals.request',
	'proposals.territory_keys',
	'proposals.result',
	'proposals.inks',
	'proposals.revision',
	'proposals.created_by',
	'proposals.created_at',
	'proposals.updated_at',
] as const;

/** Those that were not dropped, the newest first. */
export const listProposals = (db: Db, sheetId: string): Promise<ProposalNoteRow[]> =>
	db
		.selectFrom('proposals')
		.leftJoin('User', 'User.id', 'proposals.created_by')
		.select(noteColumns)
		.select(['User.name as by_name', 'User.email as by_email'])
		.where('sheet_id', '=', sheetId)
		.where('state', '!=', 'dropped')
		.orderBy('number', 'desc')
		.execute();

/** How far those at work are, and how those ended that changed in the last minutes. */
export const listProgress = (db: Db, sheetId: string) =>
	db
		.selectFrom('proposals')
		.select(['number', 'state', 'step', 'share'])
		.where('sheet_id', '=', sheetId)
		.where('state', '!=', 'dropped')
		.where(({ or, eb }) =>
			or([
				eb('state', 'in', ['waiting', 'running']),
				eb('updated_at', '>', sql<Date>`now() - interval '5 minutes'`),
			]),
		)
		.orderBy('number', 'desc')
		.execute();

export async function countOpenProposals(db: Db, sheetId: string): Promise<number> {
	const { open } = await db
		.selectFrom('proposals')
		.select(({ fn }) => fn.countAll<number>().as('open'))
		.where('sheet_id', '=', sheetId)
		.where('state', 'in', ['waiting', 'running'])
		.executeTakeFirstOrThrow();
	return Number(open);
}

export interface ProposalChange {
	state?: ProposalState;
	name?: string;
	step?: string;
	share?: number;
	territory_revision?: number;
	data_digest?: string;
	request?: string;
	territory_keys?: string[];
	assignment?: number[];
	computed?: number[];
	result?: string | null;
	inks?: string;
	revision?: number;
}

/**
 * Changes a proposal that is in one of these states; with another state whoever worked on it loses the
 * claim. Answers false when it was in none of them.
 */
export async function changeProposal(
	trx: Db,
	id: string,
	from: readonly ProposalState[],
	{ request, result, ...plain }: ProposalChange,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('proposals')
		.set({
			...plain,
			...(request === undefined ? {} : { request }),
			...(result === undefined ? {} : { result }),
			...(plain.state ? { claim: null } : {}),
			updated_at: sql`now()`,
		})
		.where('id', '=', id)
		.where('state', 'in', from)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

export type ProposalRecord = Row<'proposals'>;
