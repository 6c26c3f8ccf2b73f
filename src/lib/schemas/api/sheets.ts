import { z } from 'zod';
import { draftDocument } from '../draft.ts';
import { border, region, source } from './check-boundaries.ts';
import { explanation, proof } from './check-colouring.ts';
import { digest, finding, inkNumber, moment, regionKey } from './common.ts';

/** The team's own sheets, as programs see them. */

export const sheetNote = z.strictObject({
	number: z.int(),
	name: z.string(),
	regionCount: z.int(),
	openFindings: z.int(),
	inksUsed: z.int().nullable(),
	lastEdition: z.int().nullable(),
	savedAt: moment,
	savedBy: z.string().nullable(),
});
export const sheetList = z.strictObject({ sheets: z.array(sheetNote) });

export const edition = z.strictObject({
	number: z.int(),
	digest,
	note: z.string(),
	issuedAt: moment,
	issuedBy: z.string().nullable(),
	files: z.array(z.strictObject({ name: z.string(), mediaType: z.string(), bytes: z.int() })),
});
export const editionList = z.strictObject({ editions: z.array(edition) });

export const sheetDetail = z.strictObject({
	number: z.int(),
	name: z.string(),
	revision: z.int(),
	savedAt: moment,
	savedBy: z.string().nullable(),
	boundaries: z.strictObject({
		fileName: z.string(),
		planar: z.boolean(),
		source,
		columns: z.array(z.string()),
	}),
	regions: z.array(region),
	findings: z.array(finding.extend({ accepted: z.boolean() })),
	editions: z.array(edition),
});

export const sheetBorders = z.strictObject({
	borders: z.array(border).describe('those that bind on the sheet, by the draft’s rules'),
});

export const sheetColouring = z.discriminatedUnion('status', [
	z.strictObject({
		status: z.literal('coloured'),
		revision: z.int(),
		inksUsed: z.int(),
		colouring: z.record(regionKey, inkNumber),
		inks: z.array(z.strictObject({ name: z.string(), hex: z.string() })),
		lowerBound: z.int(),
		proof,
		message: z.string(),
	}),
	z.strictObject({ status: z.literal('impossible'), revision: z.int(), explanation }),
	z.strictObject({
		status: z.literal('undecided'),
		revision: z.int(),
		lowerBound: z.int(),
		message: z.string(),
	}),
]);

export const sheetRules = z.strictObject({ revision: z.int(), document: draftDocument });

export const rulesSaved = z.strictObject({ revision: z.int(), savedAt: moment });

const about = z.enum(['layer', 'crs', 'axes', 'keys', 'columns']);
export const question = z.strictObject({
	about,
	message: z.string(),
	free: z.boolean().describe('whether an answer that is no choice can be given as typed'),
	choices: z.array(z.strictObject({ value: z.string(), words: z.string() })),
});
export const remembered = z
	.strictObject({ about, words: z.string(), fileName: z.string() })
	.describe('an answer given for an earlier file that was taken for this one too');
export const answer = z.strictObject({
	choice: z.string().max(2_000).default('').describe('value of one of the choices'),
	typed: z
		.string()
		.max(2_000)
		.default('')
		.describe('where the question is free: a system, a column'),
	keyField: z.string().max(400).default(''),
	nameField: z.string().max(400).default(''),
});

export const intake = z.strictObject({
	id: z.uuid(),
	fileName: z.string(),
	fileBytes: z.int(),
	state: z.enum(['waiting', 'reading', 'asking', 'done', 'refused', 'cancelled', 'failed']),
	step: z.string(),
	share: z.number().min(0).max(1),
	refusal: z
		.strictObject({ code: z.string(), message: z.string(), findings: z.array(finding) })
		.nullable(),
	question: question.nullable().describe('what the file does not say, while the state is asking'),
	remembered: z.array(remembered),
	sheet: z.int().nullable().describe('number of the sheet, once it is done'),
});
