import { z } from 'zod';
import type { TerritoryDraft } from '../engines/territories/territory-draft.ts';

/** The shape and limits of what people decide about territories, as it arrives from outside. */

const key = z.string().min(1).max(400);
const pairOfRegions = z.tuple([key, key]);
/** Most regions a plan can ask for. */
const most = 100_000;

export const territoryEntry = z.strictObject({
	key: z.string().min(1).max(80),
	name: z.string().min(1).max(120),
	person: z.string().max(120),
	email: z.union([z.literal(''), z.email().max(254)]),
	base: key.nullable(),
	capacity: z.number().positive().max(100),
	frozen: z.boolean(),
	vacant: z.boolean(),
	closing: z.boolean(),
});

export const wishes = z.strictObject({
	tolerances: z.record(z.uuid(), z.number().min(0).max(10)),
	cost: z.union([z.literal('units'), z.uuid()]),
	goal: z.enum(['fewest-moves', 'least-deviation']),
	compactness: z.number().min(0).max(1),
	reach: z.int().min(1).max(50).nullable(),
	seed: z.int().min(0).max(0xffffffff),
	effort: z.enum(['quick', 'normal', 'thorough']),
});

export const territoryDraft = z.strictObject({
	territories: z.array(territoryEntry).max(2_000),
	assignment: z.record(key, z.string().min(1).max(80)),
	locks: z.record(
		key,
		z.strictObject({ territory: z.string().min(1), reason: z.string().max(500) }),
	),
	together: z.array(pairOfRegions).max(most),
	apart: z.array(pairOfRegions).max(most),
	waterLinks: z.array(pairOfRegions).max(most),
	handLinks: z.array(z.strictObject({ a: key, b: key, reason: z.string().max(500) })).max(most),
	wishes,
}) satisfies z.ZodType<TerritoryDraft>;

/** Body of `POST territories/draft`. */
export const saveTerritories = z.strictObject({
	revision: z.int().min(0),
	document: territoryDraft,
});
export type SaveTerritories = z.infer<typeof saveTerritories>;

/** Body of `POST territories/proposals/[proposal]/plan`: some regions moved, or the whole plan. */
export const savePlan = z.union([
	z.strictObject({
		revision: z.int().min(0),
		/** region key -> territory key */
		moves: z.record(key, z.string().min(1).max(80)),
	}),
	z.strictObject({
		revision: z.int().min(0),
		/** index into the proposal's `territoryKeys` for every region */
		assignment: z.array(z.int().min(0).max(2_000)).max(1_000_000),
	}),
]);
export type SavePlan = z.infer<typeof savePlan>;

/** What a proposal is asked for by. */
export const beginProposal = z.strictObject({
	name: z.string().trim().min(1, 'Give the proposal a name.').max(120),
	/** of the territories that were looked at; absent: as they stand */
	revision: z.int().min(1).optional(),
	wishes,
});
export type BeginProposal = z.infer<typeof beginProposal>;
