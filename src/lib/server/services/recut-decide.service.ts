import type { RecutChange, RecutDecision } from '../../schemas/recut.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { changeRecut } from '../repositories/recuts.repository.ts';
import { sheetOf } from './draft.service.ts';
import { Conflict } from './outcomes.ts';
import { recordRecut, withRecut } from './recut-held.ts';
import { carryBy } from './recut-plan.ts';
import { recutOf, requireApplicable } from './recut-state.ts';

/**
 * Corrects which regions go on as which. The decisions given are all there are: one is taken back by
 * leaving it out. What would follow is worked out anew.
 */
export async function decideRecut(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	recut: number,
	decisions: RecutDecision[],
): Promise<void> {
	requireAccess(member, 'boundaries.mend');
	const sheet = await sheetOf(shop.db, member, number);
	const seen = await recutOf(shop.db, sheet, recut);
	requireApplicable(sheet, seen);
	const { carried } = await carryBy(shop, sheet, seen, decisions);
	await withRecut(shop, member, number, recut, async (trx, held) => {
		requireApplicable(held.sheet, held.row);
		if (held.row.to_set !== seen.to_set) {
			throw new Conflict('stale', 'It was read again meanwhile. Look at it first.');
		}
		const { findings } = held.row.comparison as unknown as RecutChange;
		await changeRecut(trx, held.row.id, ['ready', 'put-back'], {
			decisions: JSON.stringify(decisions),
			comparison: JSON.stringify({ ...carried.change, findings } satisfies RecutChange),
			report: JSON.stringify(carried.report),
		});
		const detail = { decisions: decisions.length };
		await recordRecut(trx, member, 'decided', number, held.row, detail);
	});
}
