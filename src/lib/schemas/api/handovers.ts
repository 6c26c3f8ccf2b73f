import { z } from 'zod';
import { digest, moment } from './common.ts';

/** Handover lists as outside systems take them over. Regions and territories by their keys. */

const named = z.strictObject({ key: z.string(), name: z.string() });
const day = z.iso.date();

const note = {
	number: z.int(),
	proposal: z.strictObject({ number: z.int(), name: z.string() }),
	effectiveOn: day.describe('the day from which the moves hold'),
	state: z.enum(['open', 'approved', 'withdrawn']),
	stale: z.string().nullable().describe('what has changed since it was made, or null'),
	createdAt: moment,
	createdBy: z.string().nullable(),
	approvedAt: moment.nullable(),
	approvedBy: z.string().nullable(),
};

export const handoverList = z.strictObject({
	handovers: z.array(
		z.strictObject({
			...note,
			moves: z.int(),
			proposed: z.int(),
			accepted: z.int(),
			disputed: z.int(),
		}),
	),
});

const move = z.strictObject({
	region: named,
	from: named.nullable().describe('null: had no territory'),
	to: named,
	figures: z.record(z.string(), z.number()).describe('by the names of the measures'),
	reason: z.string(),
	state: z.enum(['proposed', 'accepted', 'disputed', 'approved']),
	word: z.string(),
	by: z.string().describe('who gave the state'),
});

export const handoverDetail = z.strictObject({
	...note,
	note: z.string(),
	measures: z.array(z.strictObject({ name: z.string(), unit: z.string() })),
	moves: z.array(move),
	digest: digest.nullable().describe('SHA-256 over the list as approved'),
});
