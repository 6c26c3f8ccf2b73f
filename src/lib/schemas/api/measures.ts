import { z } from 'zod';
import { regionKey } from './common.ts';

/** Figures of a sheet, as programs see them: by region key. */

export const measureNote = z.strictObject({
	name: z.string().describe('names the measure within its sheet'),
	unit: z.string(),
	table: z.string().describe('the table it came with'),
	total: z.number(),
	missing: z.int().describe('regions without a value'),
	confidential: z.boolean(),
	stale: z.boolean().describe('joined to earlier boundaries than the sheet has now'),
});
export const measureList = z.strictObject({ measures: z.array(measureNote) });

export const measureDetail = measureNote.extend({
	values: z.record(regionKey, z.number()).describe('regions without a value are left out'),
});

export const measureSent = z.strictObject({
	unit: z.string().max(40).default('').describe('such as h or EUR'),
	values: z.record(regionKey, z.number()).describe('by region key, none below zero'),
	mode: z
		.enum(['replace', 'add'])
		.default('replace')
		.describe('what happens to the figures of a measure that is there'),
	confidential: z.boolean().default(true).describe('may be personal or confidential'),
});
export type MeasureSent = z.infer<typeof measureSent>;

export const measureKept = measureNote.extend({
	change: z.string().nullable().describe('what differs from before, in a sentence'),
});
