import type { ColouringResult } from '../../engines/colouring/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import type { ColourDraftInput } from '../jobs/colour.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { DraftRow } from '../repositories/sheets.repository.ts';
import type { BoundaryView } from './boundary-view.ts';
import { checkedOutcome, storedResult, type Outcome } from './outcome-of-colouring.ts';
import { Unfit } from './outcomes.ts';

/** A checked colouring of a draft, or why there is none. */
export interface DraftColouring {
	outcome: Outcome;
	/** whether its inks are those that the sender showed */
	arranged: boolean;
}

/** What a colouring goes by beside the draft itself. */
type Beside = Omit<ColourDraftInput, 'keys' | 'borders' | 'draft'>;

/** Colours a draft in a thread, as near as can be to the colouring before, and has the result checked. */
export const colourDraft = async (
	shop: Pick<Workshop, 'pool'>,
	view: BoundaryView,
	draft: Draft,
	previous: number[] | null,
): Promise<Outcome> => (await colourDraftAs(shop, view, draft, { previous })).outcome;

/** The same, with the inks that its sender shows wherever they hold. */
export async function colourDraftAs(
	shop: Pick<Workshop, 'pool'>,
	{ keys, borders }: BoundaryView,
	draft: Draft,
	beside: Beside,
): Promise<DraftColouring> {
	const coloured = await shop.pool.run('colourDraft', { keys, borders, draft, ...beside });
	if (!('unfit' in coloured)) {
		return { outcome: checkedOutcome(coloured), arranged: coloured.arranged };
	}
	const { code, message, details } = coloured.unfit;
	throw new Unfit(code, message, details);
}

/**
 * A draft that asks the same as the stored one, with the inks that its sender shows; what is known of the
 * least number stays known. Null where they do not hold.
 */
export async function arrangedDraft(
	shop: Pick<Workshop, 'pool'>,
	given: { view: BoundaryView; current: DraftRow; after: Draft; shown: number[] },
): Promise<DraftColouring | null> {
	const result = storedResult(given.current);
	if (!result) return null;
	const { keys, borders } = given.view;
	const input = { keys, borders, draft: given.after, result, shown: given.shown };
	const taken: ColouringResult | null = await shop.pool.run('arrangeDraft', input);
	return taken && { outcome: checkedOutcome({ result: taken, faults: [] }), arranged: true };
}
