import { z } from 'zod';
import { differentPairs } from '../../engines/editions/draft.ts';
import { inkNumber, pair, regionKey, stats } from './common.ts';

const most = 1_000_000;
const pairs = z.array(pair).max(5 * most);

const groups = z
	.array(
		z.strictObject({
			kind: z.enum(['alike', 'different']),
			name: z.string().max(200).default('').describe('for the sender; nothing depends on it'),
			keys: z.array(regionKey).min(2).max(most),
		}),
	)
	.max(most)
	.refine((list) => differentPairs(list) <= 5 * most, {
		message: `groups in which all differ come to more than ${5 * most} pairs`,
	});

export const colouringRequest = z.strictObject({
	regions: z.array(regionKey).max(most).describe('every region once'),
	borders: pairs.describe('pairs of regions that must differ'),
	inks: z.union([z.int().min(1).max(65_535), z.literal('fewest')]),
	locks: z.record(regionKey, inkNumber).default({}),
	forbidden: z.record(regionKey, z.array(inkNumber)).default({}),
	alike: pairs.default([]),
	apart: pairs.default([]),
	groups: groups
		.default([])
		.describe('rules for many regions at once: all alike, or every one different from every other'),
	reserved: z
		.array(inkNumber)
		.max(1_000)
		.default([])
		.describe('inks that a region has only when it, or one kept alike with it, is locked to them'),
	lockCosts: z.record(regionKey, z.number().positive()).default({}),
	previous: z.record(regionKey, inkNumber).optional(),
	goal: z.enum(['any', 'fewest-changes', 'even', 'distinct']).default('any'),
	areas: z.record(regionKey, z.number().min(0)).optional(),
	lengths: z.array(z.number().min(0)).optional().describe('metres, one a border in order'),
	inkDistances: z.array(z.array(z.number().min(0))).optional(),
	seed: z.int().min(0).max(0xffffffff).default(0),
	effort: z.enum(['quick', 'normal', 'thorough']).default('normal'),
});
export type ColouringRequest = z.infer<typeof colouringRequest>;

export const proof = z.strictObject({
	kind: z.enum([
		'none-needed',
		'edge',
		'odd-cycle',
		'clique',
		'odd-wheel',
		'refutation',
		'not-proved',
	]),
	regions: z
		.array(regionKey)
		.describe('an odd cycle in ring order; an odd wheel hub first, then its rim in ring order'),
	refutation: z
		.strictObject({ inks: z.int(), format: z.literal('drup'), clauses: z.string() })
		.optional()
		.describe('the variable of region i (from 1, in `regions`) and ink c is (i-1)*inks + c + 1'),
});

export const rule = z.union([
	z.strictObject({ kind: z.enum(['border', 'alike', 'apart']), a: regionKey, b: regionKey }),
	z.strictObject({ kind: z.enum(['forbidden', 'reserved']), region: regionKey, ink: inkNumber }),
	z.strictObject({ kind: z.literal('inks'), inks: z.int() }),
]);

export const explanation = z.strictObject({
	locks: z.array(regionKey).describe('together these collide; without any one of them they do not'),
	rules: z.array(rule),
	regions: z.array(regionKey),
	message: z.string(),
	release: z
		.strictObject({
			locks: z.array(regionKey),
			cost: z.number(),
			proved: z.boolean(),
			lowerBound: z.number(),
		})
		.nullable(),
	inksThatWouldDo: z.int().nullable(),
});

export const colouringResponse = z.discriminatedUnion('status', [
	z.strictObject({
		status: z.literal('coloured'),
		inksUsed: z.int(),
		colouring: z.record(regionKey, inkNumber),
		lowerBound: z.int(),
		proof,
		changes: z.strictObject({ count: z.int(), lowerBound: z.int() }).optional(),
		objective: z.number().optional(),
		stats,
	}),
	z.strictObject({ status: z.literal('impossible'), explanation, stats }),
	z.strictObject({
		status: z.literal('undecided'),
		lowerBound: z.int(),
		message: z.string(),
		stats,
	}),
]);
export type ColouringResponse = z.infer<typeof colouringResponse>;
