import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { SeriesParts, TemplateContent } from '../database/schema.ts';

const stored = ({ fields, ratio, palette }: TemplateContent) => ({
	fields: JSON.stringify(fields),
	ratio,
	palette: palette && JSON.stringify(palette),
});

export const listTemplates = (db: Db, teamId: string) =>
	db
		.selectFrom('layout_templates')
		.selectAll()
		.where('team_id', '=', teamId)
		.orderBy(sql`lower(name)`)
		.execute();

export const findTemplate = (db: Db, teamId: string, id: string) =>
	db
		.selectFrom('layout_templates')
		.selectAll()
		.where('team_id', '=', teamId)
		.where('id', '=', id)
		.executeTakeFirst();

/** The same, held against every other change until the transaction ends. */
export const holdTemplate = (trx: Db, teamId: string, id: string) =>
	trx
		.selectFrom('layout_templates')
		.selectAll()
		.where('team_id', '=', teamId)
		.where('id', '=', id)
		.forUpdate()
		.executeTakeFirst();

/** Adds a template; undefined when the team has one of this name already, whatever its capitals. */
export const insertTemplate = (
	trx: Db,
	entry: TemplateContent & { teamId: string; name: string; createdBy: string | null },
) =>
	trx
		.insertInto('layout_templates')
		.values({
			team_id: entry.teamId,
			name: entry.name,
			created_by: entry.createdBy,
			...stored(entry),
		})
		.onConflict((conflict) => conflict.doNothing())
		.returning('id')
		.executeTakeFirst();

/** Lets one after another add or name a template of a team, until the transaction ends. */
export async function holdTemplateNames(trx: Db, teamId: string): Promise<void> {
	const held = `template names of ${teamId}`;
	await sql`select pg_advisory_xact_lock(hashtextextended(${held}, 0))`.execute(trx);
}

export async function templateNamed(db: Db, teamId: string, name: string) {
	return db
		.selectFrom('layout_templates')
		.select('id')
		.where('team_id', '=', teamId)
		.where(sql`lower(name)`, '=', sql`lower(${name})`)
		.executeTakeFirst();
}

export const updateTemplate = (trx: Db, id: string, change: { name: string } | TemplateContent) =>
	trx
		.updateTable('layout_templates')
		.set(({ eb }) => ({
			...('name' in change ? change : stored(change)),
			revision: eb('revision', '+', 1),
			updated_at: sql<Date>`now()`,
		}))
		.where('id', '=', id)
		.execute();

export const deleteTemplate = (trx: Db, id: string) =>
	trx.deleteFrom('layout_templates').where('id', '=', id).execute();

/** The sheets of a team whose present draft was set by some template, with what of them it touches. */
export const sheetsByTemplate = (db: Db, teamId: string) =>
	db
		.selectFrom('sheets')
		.innerJoin('drafts', (join) =>
			join
				.onRef('drafts.sheet_id', '=', 'sheets.id')
				.onRef('drafts.revision', '=', 'sheets.revision'),
		)
		.select([
			'sheets.number',
			'sheets.name',
			'sheets.revision',
			sql<string>`drafts.document #>> '{layout,collar,template,id}'`.as('template'),
			sql<SeriesParts['layout']>`drafts.document -> 'layout'`.as('layout'),
			sql<SeriesParts['palette']>`drafts.document -> 'palette'`.as('palette'),
		])
		.where('sheets.team_id', '=', teamId)
		.where(sql`drafts.document #>> '{layout,collar,template,id}'`, 'is not', null)
		.orderBy('sheets.number')
		.execute();
