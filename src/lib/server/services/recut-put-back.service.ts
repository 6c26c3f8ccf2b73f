import { noTerritories } from '../../engines/territories/territory-draft.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { moveTables, writeFigures } from '../repositories/recut-figures.repository.ts';
import { changeRecut } from '../repositories/recuts.repository.ts';
import {
	giveBoundaries,
	insertDraft,
	type SheetRecord,
} from '../repositories/sheets.repository.ts';
import { insertTerritoryDraft } from '../repositories/territories.repository.ts';
import { draftOf, documentOf } from './draft.service.ts';
import { Conflict, Unfit } from './outcomes.ts';
import { beforeOf, type Before } from './recut-before.ts';
import { recordRecut, withRecut, type Held } from './recut-held.ts';
import { losses } from './recut-losses.ts';
import { territoriesIn, territoryDraftOf } from './territory-state.ts';

/**
 * Gives a sheet the boundaries back that it had before a re-cut was applied, with its draft, territories and
 * figures as they were, as new revisions. Only the re-cut that was applied last can be put back. What was
 * saved since stays among the revisions; it is told, and only taken away by somebody who is sure.
 */
export async function putBackRecut(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	recut: number,
	sure: boolean,
): Promise<{ revision: number }> {
	requireAccess(member, 'boundaries.mend');
	return withRecut(shop, member, number, recut, async (trx, held) => {
		const { sheet, row } = held;
		const before = beforeOf(row);
		if (row.state !== 'applied' || !before) {
			throw new Conflict('not-applied', 'Only a re-cut that is applied can be put back.');
		}
		if (row.to_set !== sheet.boundary_set_id) {
			throw new Conflict(
				'not-last',
				'Another re-cut was applied after this one. Put that one back first.',
			);
		}
		const lost = await losses(trx, sheet, before);
		if (lost.length > 0 && !sure) {
			throw new Unfit('sure-needed', `${lost.join(' ')} Say that you are sure.`, { lost });
		}
		const revision = await restore(trx, member, held, before);
		await changeRecut(trx, row.id, ['applied'], {
			...{ state: 'put-back', put_back_by: member.userId, put_back_at: new Date() },
		});
		await recordRecut(trx, member, 'put-back', sheet.number, row, { revision, lost });
		return { revision };
	});
}

async function restore(
	trx: Trx,
	member: Member,
	{ sheet, row }: Held,
	before: Before,
): Promise<number> {
	await giveBoundaries(trx, sheet.id, row.from_set);
	const draft = await draftOf(trx, sheet.id, before.draft);
	const revision = sheet.revision + 1;
	await insertDraft(trx, {
		...{ sheetId: sheet.id, revision, document: documentOf(draft), savedBy: member.userId },
		...{ colouringId: draft.colouring_id, explanation: draft.explanation },
	});
	await restoreTerritories(trx, member, sheet, { before, number: row.number });
	await writeFigures(trx, before.measures);
	await moveTables(trx, before.measures, row.from_set);
	return revision;
}

async function restoreTerritories(
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	{ before, number }: { before: Before; number: number },
): Promise<void> {
	if (sheet.territory_revision === before.territories) return;
	const row = await territoryDraftOf(trx, sheet.id, before.territories);
	await insertTerritoryDraft(trx, {
		...{ sheetId: sheet.id, revision: sheet.territory_revision + 1 },
		...{ document: row ? territoriesIn(row) : noTerritories, inks: row?.inks ?? {} },
		...{ change: `recut ${number} put back`, savedBy: member.userId },
	});
}
