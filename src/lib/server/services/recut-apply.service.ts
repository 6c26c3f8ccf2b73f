import { isDeepStrictEqual } from 'node:util';
import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findBoundarySet } from '../repositories/boundaries.repository.ts';
import { moveTables, writeFigures } from '../repositories/recut-figures.repository.ts';
import { changeRecut } from '../repositories/recuts.repository.ts';
import { giveBoundaries, insertColouring, insertDraft } from '../repositories/sheets.repository.ts';
import { insertTerritoryDraft } from '../repositories/territories.repository.ts';
import { sheetOf } from './draft.service.ts';
import { Conflict } from './outcomes.ts';
import { figuresDigest, figuresOf, type Before } from './recut-before.ts';
import { rememberColumns } from './reading-answers.service.ts';
import { recordRecut, withRecut, type Held } from './recut-held.ts';
import { planApply, type ApplyPlan } from './recut-plan.ts';
import { presentMeasures } from './recut-standing.ts';
import { recutOf, requireApplicable } from './recut-state.ts';

/** People save while it is worked out; after so many times somebody has to look. */
const mostTries = 3;

/**
 * Gives a sheet the boundaries of a re-cut: the draft follows as a new revision, coloured near to what it was
 * and checked, territories follow as theirs, figures are carried over; all of it or nothing. What stood
 * before is noted, so that it can be put back. Editions are not touched.
 * @param revision of the sheet as it was seen; when given, nothing is done on top of a later one
 */
export async function applyRecut(
	shop: Workshop,
	member: Member,
	number: number,
	recut: number,
	revision?: number,
): Promise<{ revision: number }> {
	requireAccess(member, 'boundaries.mend');
	for (let tries = 0; tries < mostTries; tries++) {
		const sheet = await sheetOf(shop.db, member, number);
		const row = await recutOf(shop.db, sheet, recut);
		requireApplicable(sheet, row);
		if (revision !== undefined && revision !== sheet.revision) throw savedMeanwhile();
		const plan = await planApply(shop, sheet, row);
		const applied = await withRecut(shop, member, number, recut, (trx, held) =>
			store(trx, member, held, plan),
		);
		if (applied) return applied;
	}
	throw savedMeanwhile();
}

const savedMeanwhile = () =>
	new Conflict(
		'saved-meanwhile',
		'Somebody else saved the sheet meanwhile; nothing was applied. Look, then try again.',
	);

/** Writes the plan, unless what it was worked out from has changed: then it answers null. */
async function store(
	trx: Trx,
	member: Member,
	held: Held,
	plan: ApplyPlan,
): Promise<{ revision: number } | null> {
	const { sheet, row } = held;
	requireApplicable(sheet, row);
	if (!(await isStillSo(trx, held, plan)) || !row.to_set) return null;
	await giveBoundaries(trx, sheet.id, row.to_set);
	const before: Before = {
		...{ draft: sheet.revision, territories: sheet.territory_revision },
		measures: plan.measures.map(figuresOf),
		wrote: {
			draft: await storeDraft(trx, member, held, plan),
			territories: await storeTerritories(trx, member, held, plan),
			measures: await storeFigures(trx, plan, row.to_set),
		},
	};
	await changeRecut(trx, row.id, ['ready', 'put-back'], {
		...{ state: 'applied', applied_by: member.userId, applied_at: new Date() },
		...{ put_back_by: null, put_back_at: null },
		before: JSON.stringify(before),
		report: JSON.stringify(plan.carried.report),
	});
	await rememberChoice(trx, member, held);
	const detail = { regions: plan.carried.change.regions.after, revision: before.wrote.draft };
	await recordRecut(trx, member, 'applied', sheet.number, row, detail);
	return { revision: before.wrote.draft };
}

/** Columns that were tried and dropped are nothing to remember; those of the boundaries that stand are. */
async function rememberChoice(trx: Trx, member: Member, { row }: Held): Promise<void> {
	const taken = (row.remembered ?? []) as { about: string }[];
	const set = row.to_set ? await findBoundarySet(trx, row.to_set) : undefined;
	if (row.kind === 'mends' || taken.some(({ about }) => about === 'columns')) return;
	const given = { teamId: member.team.id, userId: member.userId, fileName: row.file_name };
	const likeness = String(set?.found?.likeness ?? '');
	await rememberColumns(trx, { ...given, likeness }, row.options);
}

async function isStillSo(trx: Trx, { sheet, row }: Held, plan: ApplyPlan): Promise<boolean> {
	const same =
		sheet.revision === plan.sheet.revision &&
		sheet.territory_revision === plan.sheet.territory_revision &&
		sheet.boundary_set_id === plan.sheet.boundary_set_id &&
		row.to_set === plan.row.to_set &&
		isDeepStrictEqual(row.decisions, plan.row.decisions);
	if (!same) return false;
	const measures = await presentMeasures(trx, sheet);
	return isDeepStrictEqual(measures.map(figuresOf), plan.measures.map(figuresOf));
}

async function storeDraft(
	trx: Trx,
	member: Member,
	{ sheet }: Held,
	{ carried, outcome }: ApplyPlan,
): Promise<number> {
	const revision = sheet.revision + 1;
	const colouringId =
		outcome.colouring && (await insertColouring(trx, sheet.id, outcome.colouring));
	await insertDraft(trx, {
		...{ sheetId: sheet.id, revision, document: carried.draft, colouringId },
		...{ explanation: outcome.explanation, savedBy: member.userId },
	});
	return revision;
}

async function storeTerritories(
	trx: Trx,
	member: Member,
	{ sheet, row }: Held,
	{ carried, inks }: ApplyPlan,
): Promise<number> {
	if (!carried.territories) return sheet.territory_revision;
	const revision = sheet.territory_revision + 1;
	await insertTerritoryDraft(trx, {
		...{ sheetId: sheet.id, revision, document: carried.territories, inks },
		...{ change: `recut ${row.number}`, savedBy: member.userId },
	});
	return revision;
}

/** Tables under review stay with the regions they were joined to: they are joined again on their page. */
async function storeFigures(
	trx: Trx,
	{ carried, measures }: ApplyPlan,
	toSet: string,
): Promise<Record<string, string>> {
	const tables = new Map(measures.map(({ id, table_id }) => [id, table_id]));
	const figures = carried.measures.map((one) => ({ ...one, table: tables.get(one.id) ?? '' }));
	await writeFigures(trx, figures);
	await moveTables(trx, figures, toSet);
	return Object.fromEntries(figures.map((one) => [one.id, figuresDigest(one)]));
}
