import { z } from 'zod';
import type { Mend } from '../engines/boundaries/mends/mend.ts';
import type { RecutDecision } from './recut.ts';
import { readingFields } from './upload.ts';

/** The forms by which questions are answered and boundaries are changed. */

const key = z.string().min(1).max(1_000);
const at = z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)]);

/** One step that mends a fault of a file. */
export const mend = z.discriminatedUnion('kind', [
	z.strictObject({ kind: z.literal('fill'), at, into: key }),
	z.strictObject({ kind: z.literal('settle'), a: key, b: key, keep: key }),
	z.strictObject({ kind: z.literal('drop'), key }),
	z.strictObject({ kind: z.literal('merge'), key, into: key }),
	z.strictObject({ kind: z.literal('untangle'), key }),
	z.strictObject({ kind: z.literal('part'), key, at, into: key.nullable() }),
]) satisfies z.ZodType<Mend>;

/** What one recipe may hold: each step is replayed at every reading. */
export const mostMends = 5_000;
const mostAtOnce = 500;

/** A JSON text in a form field, read by a schema. */
const jsonText = <S extends z.ZodType>(schema: S) =>
	z
		.string()
		.max(2_000_000)
		.transform((text, context) => {
			try {
				return JSON.parse(text) as unknown;
			} catch {
				context.addIssue({ code: 'custom', message: 'This is not JSON.' });
				return z.NEVER;
			}
		})
		.pipe(schema);

export const mendForm = z.object({ mends: jsonText(z.array(mend).min(1).max(mostAtOnce)) });
export const unmendForm = z.object({ mend: jsonText(mend) });

export const rereadForm = readingFields.extend({ mends: z.enum(['keep', 'drop']).default('keep') });
export type RereadFields = z.infer<typeof rereadForm>;

const decision = z.strictObject({
	before: key.nullable(),
	after: z.array(key).max(1_000),
}) satisfies z.ZodType<RecutDecision>;
export const decisions = z.array(decision).max(10_000);
export const decideForm = z.object({ decisions: jsonText(decisions) });

const blank = (most: number) =>
	z
		.string()
		.max(most)
		.default('')
		.transform((text) => text.trim());

/** The answer to a question: one of its choices or, where that is offered, something typed. */
export const answerFields = z.object({
	choice: blank(2_000),
	typed: blank(2_000),
	keyField: blank(400),
	nameField: blank(400),
});
export type AnswerFields = z.infer<typeof answerFields>;

export const applyForm = z.object({
	/** of the sheet, as it was seen */
	revision: z.coerce.number().int().positive().optional(),
});
export const putBackForm = z.object({ sure: z.enum(['yes', '']).default('') });

export const forgetForm = z.object({
	about: z.enum(['layer', 'crs', 'axes', 'keys', 'columns']),
	likeness: z.string().min(1).max(200),
});
