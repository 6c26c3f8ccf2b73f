import { z } from 'zod';
import { borderKinds } from '../../engines/borders/border-list.ts';
import { finding, moment, regionKey } from './common.ts';
import { question, remembered } from './sheets.ts';

/** Changes of a sheet's boundaries, as programs see them. */

const state = z.enum([
	...(['waiting', 'reading', 'asking', 'ready', 'applied', 'put-back'] as const),
	...(['dropped', 'refused', 'cancelled', 'failed'] as const),
]);
const outcome = z.enum(['kept', 'renamed', 'split', 'merged', 'redrawn', 'new', 'gone']);

export const recutNote = z.strictObject({
	number: z.int(),
	kind: z.enum(['file', 'reading', 'mends']),
	state,
	fileName: z.string(),
	words: z.string().describe('what it does, in one sentence'),
	step: z.string(),
	share: z.number().min(0).max(1),
	createdAt: moment,
	createdBy: z.string().nullable(),
	appliedAt: moment.nullable(),
	appliedBy: z.string().nullable(),
	putBackAt: moment.nullable(),
	putBackBy: z.string().nullable(),
});
export const recutList = z.strictObject({ recuts: z.array(recutNote) });
export const recutBegun = z.strictObject({ number: z.int() });

const region = z.strictObject({
	key: regionKey,
	name: z.string(),
	areaKm2: z.number(),
	share: z.number().min(0).max(1).describe('of its area that the other side of the group covers'),
});
const group = z.strictObject({
	outcome,
	by: z.enum(['key', 'area', 'hand']),
	doubt: z.string().nullable(),
	words: z.string(),
	before: z.array(region),
	after: z.array(region),
});

const side = z.strictObject({ kind: z.enum(borderKinds), metres: z.number() }).nullable();
const pairs = z.array(z.strictObject({ a: regionKey, b: regionKey, before: side, after: side }));

export const recutDetail = recutNote.extend({
	stale: z.boolean(),
	hindrance: z.string().nullable().describe('why it cannot be applied now'),
	question: question.nullable(),
	remembered: z.array(remembered),
	refusal: z
		.strictObject({ code: z.string(), message: z.string(), findings: z.array(finding) })
		.nullable(),
	change: z
		.strictObject({
			regions: z.strictObject({ before: z.int(), after: z.int() }),
			counts: z.record(outcome, z.int()).describe('of regions before, or new ones'),
			groups: z.array(group).describe('all but plainly kept regions, at most 2,000'),
			groupsLeftOut: z.int(),
			pairs: z.strictObject({
				...{ gained: pairs, lost: pairs, changed: pairs },
				counts: z.strictObject({ gained: z.int(), lost: z.int(), changed: z.int() }),
			}),
			findings: z.strictObject({
				...{ gone: z.array(finding), come: z.array(finding) },
				counts: z.strictObject({ gone: z.int(), come: z.int() }),
			}),
		})
		.nullable(),
	report: z.array(
		z.strictObject({
			stage: z.enum(['draft', 'territories', 'measures']),
			what: z.string(),
			...{ keys: z.array(regionKey), now: z.array(regionKey) },
			outcome: z.enum(['followed', 'copied', 'doubled', 'dropped', 'settled', 'changed']),
			words: z.string(),
		}),
	),
	loses: z.array(z.string()).describe('what putting it back would take away'),
});

export const recutApplying = z.strictObject({
	revision: z.int().min(1).optional().describe('of the sheet, as it was seen'),
});
export const recutPuttingBack = z.strictObject({
	sure: z.boolean().default(false).describe('needed where something would be lost'),
});
export const recutDone = z.strictObject({ revision: z.int().describe('of the sheet now') });
export const recutEnded = z.strictObject({ number: z.int() });
