import type { RegionMatch } from '../../engines/boundaries/recut/index.ts';
import { draftFaults } from '../../engines/territories/draft-faults.ts';
import type { RecutDecision } from '../../schemas/recut.ts';
import type { CarryOutcome } from '../jobs/recut-carry.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { MeasureRow } from '../repositories/measures.repository.ts';
import { readMatching, type RecutRecord } from '../repositories/recuts.repository.ts';
import type { DraftRow, SheetRecord } from '../repositories/sheets.repository.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { colourDraft } from './draft-colouring.ts';
import type { Outcome } from './outcome-of-colouring.ts';
import { Conflict, Unfit } from './outcomes.ts';
import { withGapsAs } from './recut-gaps.ts';
import { standingRows } from './recut-standing.ts';
import { inksOn } from './territory-inks.ts';

type Carried = Extract<CarryOutcome, { status: 'carried' }>;

/** Everything decided on the present boundaries, carried over by the matching as these decisions have it. */
export async function carryBy(
	shop: Pick<Workshop, 'db' | 'pool'>,
	sheet: SheetRecord,
	row: RecutRecord,
	decisions: RecutDecision[],
): Promise<{ carried: Carried; draft: DraftRow; measures: MeasureRow[]; view: BoundaryView }> {
	const matching = await readMatching(shop.db, row.id);
	if (!matching || !row.to_set)
		throw new Conflict('not-ready', 'It has not been read and compared.');
	const { standing, draft, measures } = await standingRows(shop.db, sheet);
	const before = await boundaryView(shop.db, sheet.boundary_set_id);
	const { view, short } = await withGapsAs(shop, before, row.to_set);
	const outcome = await shop.pool.run('carryRecut', {
		...{ matching: matching as unknown as RegionMatch, decisions, standing },
		before: before.asRead,
		after: view.asRead,
		fresh: { borders: view.borders, columns: view.set.columns },
	});
	if (outcome.status === 'refused') {
		throw new Unfit('unfit-decisions', outcome.reasons.slice(0, 5).join(' '), {
			reasons: outcome.reasons.slice(0, 50),
		});
	}
	const carried = { ...outcome, report: [...outcome.report, ...short] };
	return { carried, draft, measures, view };
}

/** What applying a re-cut writes, worked out before anything is held. */
export interface ApplyPlan {
	sheet: SheetRecord;
	row: RecutRecord;
	carried: Carried;
	/** figures as they were read */
	measures: MeasureRow[];
	/** of the carried draft, checked */
	outcome: Outcome;
	/** of the carried territories */
	inks: Record<string, number>;
}

/** Colours the carried draft near to what stands, and sees that the carried territories hold together. */
export async function planApply(
	shop: Workshop,
	sheet: SheetRecord,
	row: RecutRecord,
): Promise<ApplyPlan> {
	const decisions = row.decisions as unknown as RecutDecision[];
	const { carried, measures, view } = await carryBy(shop, sheet, row, decisions);
	const outcome = await colourDraft(
		shop,
		view,
		carried.draft,
		carried.previous && [...carried.previous],
	);
	const inks = await territoryInks(shop, sheet, view, carried);
	return { sheet, row, carried, measures, outcome, inks };
}

async function territoryInks(
	shop: Workshop,
	sheet: SheetRecord,
	view: BoundaryView,
	{ territories, draft }: Carried,
): Promise<Record<string, number>> {
	if (!territories) return {};
	const { keys, borders } = view;
	const [fault] = draftFaults({ keys, borders }, territories);
	if (fault) {
		throw new Unfit('unfit-territories', `The territories cannot follow: ${fault.message}`);
	}
	return (await inksOn(shop, sheet.id, { view, drawn: draft }, territories)).inks;
}
