import { z } from 'zod';
import { stats } from './common.ts';

const most = 1_000_000;
const unitKey = z.string().min(1).max(400).describe('key of a unit');
const territoryKey = z.string().min(1).max(400).describe('key of a territory');
const measureName = z.string().min(1).max(200);
const unitPairs = z.array(z.tuple([unitKey, unitKey])).max(5 * most);

export const territoriesRequest = z.strictObject({
	units: z
		.array(
			z.strictObject({
				key: unitKey,
				measures: z
					.record(measureName, z.number().nullable())
					.default({})
					.describe('null where a figure is missing'),
				territory: territoryKey
					.nullable()
					.default(null)
					.describe('its territory today; null for none'),
			}),
		)
		.min(1)
		.max(most)
		.describe('every unit once'),
	borders: unitPairs.describe('pairs of units that count as joined'),
	territories: z
		.array(
			z.strictObject({
				key: territoryKey,
				base: unitKey.nullable().default(null),
				capacity: z.number().positive().max(1e9).default(1).describe('share of a full load'),
				frozen: z.boolean().default(false).describe('keeps exactly the units of today'),
				closing: z.boolean().default(false).describe('ends empty and has no target'),
			}),
		)
		.min(1)
		.max(10_000),
	locks: z.record(unitKey, territoryKey).default({}),
	together: unitPairs.default([]),
	apart: unitPairs.default([]),
	tolerance: z
		.record(measureName, z.number().min(0).max(1e6))
		.default({})
		.describe('largest deviation from the target, 0.1 for 10 %, inclusive; others are free'),
	cost: z
		.string()
		.min(1)
		.max(200)
		.default('units')
		.describe('what a move costs: `units` for 1 each, else the name of a measure'),
	goal: z.enum(['fewest-moves', 'least-deviation']).default('fewest-moves'),
	reach: z
		.int()
		.min(0)
		.max(254)
		.nullable()
		.default(null)
		.describe('a unit goes only to territories whose area today lies within so many steps'),
	seed: z.int().min(0).max(0xffffffff).default(0),
	effort: z.enum(['quick', 'normal', 'thorough']).default('normal'),
});
export type TerritoriesRequest = z.infer<typeof territoriesRequest>;

export const territoryMove = z.strictObject({
	unit: unitKey,
	from: territoryKey.nullable(),
	to: territoryKey,
	compulsory: z
		.boolean()
		.describe('a unit of a closing territory, of none, or torn from its own today'),
});

const deviations = z
	.record(measureName, z.record(territoryKey, z.number()))
	.describe('(load - target)/target of every territory that stays');

const cutBorders = z.strictObject({ before: z.int(), after: z.int() });

const plan = {
	assignment: z.record(unitKey, territoryKey),
	moves: z.array(territoryMove),
	cost: z.number().describe('of every move, compulsory ones too'),
	compulsoryCost: z.number(),
	deviations,
	cutBorders,
};

const wider = z.strictObject({
	kind: z.literal('tolerance'),
	measure: measureName,
	value: z.number(),
});
const freer = z.strictObject({ kind: z.enum(['unlock', 'split']), unit: unitKey });
const thawed = z.strictObject({ kind: z.literal('unfreeze'), territory: territoryKey });
export const relief = z.union([wider, freer, thawed]);

const sentence = z.string();
export const reliefInWords = z.union([
	wider.extend({ sentence }),
	freer.extend({ sentence }),
	thawed.extend({ sentence }),
]);

export const impossibleReason = z.enum([
	'unit-too-heavy',
	'lock-cut-off',
	'frozen-outside-tolerance',
	'island-load',
	'missing-value',
	'no-plan',
]);

export const territoriesResponse = z.discriminatedUnion('status', [
	z.strictObject({
		status: z.literal('proposed'),
		...plan,
		lowerBound: z.number().describe('no plan that keeps the rules costs less'),
		proved: z.boolean().describe('the cost is the least possible'),
		stats,
	}),
	z.strictObject({
		status: z.literal('impossible'),
		reason: impossibleReason,
		message: z.string(),
		witness: z.strictObject({ units: z.array(unitKey), territories: z.array(territoryKey) }),
		relief: z.array(relief),
		stats,
	}),
	z.strictObject({
		status: z.literal('undecided'),
		best: z
			.strictObject(plan)
			.optional()
			.describe('the plan that came nearest: true to the rules, outside some tolerance'),
		lowerBound: z.number(),
		message: z.string(),
		stats,
	}),
]);
