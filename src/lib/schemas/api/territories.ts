import { z } from 'zod';
import { territoryDraft, wishes } from '../territories.ts';
import { impossibleReason, reliefInWords, territoryMove } from './check-territories.ts';
import { inkNumber, moment, regionKey } from './common.ts';

/** The team's own territories and proposals, as programs see them: measures are named by their ids. */

const inks = z.record(z.string(), inkNumber).describe('ink of each territory, by key');
const inkNote = z.string().nullable().describe('why there are no inks, where there are none');

export const territories = z.strictObject({
	revision: z.int().describe('0 before the first save'),
	savedAt: moment.nullable(),
	savedBy: z.string().nullable(),
	document: territoryDraft,
	inks,
	inkNote,
});

export const territoriesSaved = z.strictObject({
	revision: z.int(),
	savedAt: moment,
	inks,
	inkNote,
	changedInks: z.array(z.string()).describe('territories whose ink differs from the one before'),
});

const share = z.record(z.string(), z.number());

const outcome = z.strictObject({
	moved: z.int(),
	cost: z.number(),
	compulsoryCost: z.number(),
	compulsory: z.int(),
	lowerBound: z.number().describe('no plan that keeps the rules costs less'),
	proved: z.boolean(),
	cutBorders: z.strictObject({ before: z.int(), after: z.int() }),
	largest: share.describe('largest deviation by measure'),
	mean: share,
	outside: z.int().describe('territories outside some tolerance'),
	faults: z.array(z.string()).describe('rules it breaks after edits by hand'),
	misses: z.array(z.string()).describe('tolerances it misses'),
	reason: impossibleReason.nullable(),
	relief: z.array(reliefInWords),
	witness: z
		.strictObject({ regions: z.array(regionKey), territories: z.array(z.string()) })
		.nullable(),
});

export const proposalNote = z.strictObject({
	number: z.int(),
	name: z.string(),
	state: z.enum([
		...(['waiting', 'running', 'kept', 'impossible', 'undecided'] as const),
		...(['failed', 'cancelled', 'adopted', 'dropped'] as const),
	]),
	step: z.string(),
	share: z.number().min(0).max(1),
	createdAt: moment,
	createdBy: z.string().nullable(),
	wishes,
	revision: z.int().describe('counts the edits by hand'),
	stale: z.string().nullable().describe('what it was computed from and has changed since'),
	sentence: z.string(),
});
export const proposalList = z.strictObject({ proposals: z.array(proposalNote) });

export const proposalDetail = proposalNote.extend({
	outcome: outcome.nullable(),
	assignment: z.record(regionKey, z.string()).nullable(),
	moves: z.array(territoryMove.omit({ unit: true }).extend({ region: regionKey })),
	deviations: z
		.record(z.string(), share)
		.describe('by measure and territory: (load - target)/target'),
});

export const proposalAsked = z.strictObject({ number: z.int() });
export const adoption = z.strictObject({
	revision: z.int().min(0).describe('of the proposal that was looked at'),
	outside: z.boolean().default(false).describe('accept tolerances that it misses'),
});
export const adopted = z.strictObject({ revision: z.int().describe('of the territories') });
export const proposalEnded = z.strictObject({
	number: z.int(),
	state: z.enum(['cancelled', 'dropped']),
});
