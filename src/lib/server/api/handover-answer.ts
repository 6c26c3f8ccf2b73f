import type { z } from 'zod';
import type { handoverDetail } from '../../schemas/api/handovers.ts';
import type { Handover } from '../../schemas/handover.ts';

/** A handover list as the API answers it: moves and states, no letters and no addresses of territories. */
export const handoverAnswer = (list: Handover): z.input<typeof handoverDetail> => ({
	number: list.number,
	proposal: list.proposal,
	effectiveOn: list.effectiveOn,
	state: list.state,
	stale: list.stale,
	createdAt: list.createdAt,
	createdBy: list.createdBy,
	approvedAt: list.approvedAt,
	approvedBy: list.approvedBy,
	note: list.note,
	measures: list.measures.map(({ name, unit }) => ({ name, unit })),
	moves: list.moves.map(({ region, from, to, figures, reason, state, word, by }) => ({
		...{ region, from, to, figures, reason, state, word, by },
	})),
	digest: list.digest,
});
