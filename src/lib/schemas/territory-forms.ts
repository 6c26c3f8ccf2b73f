import { z } from 'zod';
import { wishes, type BeginProposal } from './territories.ts';

/** The forms of the territories stage, as they arrive: every field is text. */

const revision = z.coerce.number().int().min(0);

/** A column that names the territory of every region: `measure:<id>` or `attribute:<name>`. */
export const columnSource = z
	.string()
	.regex(/^(measure|attribute):./, 'Choose a column.')
	.transform((text) => {
		const at = text.indexOf(':');
		return { kind: text.slice(0, at) as 'measure' | 'attribute', name: text.slice(at + 1) };
	});
export type ColumnSource = z.output<typeof columnSource>;

export const fromColumnForm = z.object({ revision, source: columnSource });
export type FromColumn = z.output<typeof fromColumnForm>;

export const fromScratchForm = z.object({
	revision,
	territories: z.coerce
		.number('How many territories?')
		.int('How many territories?')
		.min(2, 'At least two territories.')
		.max(2_000, 'At most 2,000 territories.'),
	/** id of the measure to even out; '' counts regions */
	measure: z.union([z.literal(''), z.uuid()]).transform((id) => id || null),
	seed: z.coerce.number().int().min(0).max(0xffffffff).default(1),
});
export type FromScratch = z.output<typeof fromScratchForm>;

const percentField = /^tolerance\.(.+)$/;

/** A share from `10`, `7.5` or `7,5` per cent. */
const percent = z
	.string()
	.trim()
	.regex(/^\d{1,4}([.,]\d+)?$/, 'A tolerance is a percentage such as 10 or 7.5.')
	.transform((text) => Number(text.replace(',', '.')) / 100);

/**
 * The form that asks for a proposal: `name`, `revision`, one field `tolerance.<measure id>` a measure
 * (per cent; empty: free), `cost`, `goal`, `compactness` (0 to 1), `reach` (empty: no such rule), `seed`,
 * `effort`.
 */
export const beginForm = z
	.looseObject({
		name: z.string().trim().min(1, 'Give the proposal a name.').max(120),
		revision: z.coerce.number().int().min(1, 'Save territories first.'),
		cost: z.string().default('units'),
		goal: z.string().default('fewest-moves'),
		compactness: z.coerce.number().default(0.15),
		reach: z
			.string()
			.default('')
			.transform((text) => (text.trim() === '' ? null : Number(text))),
		seed: z.coerce.number().default(1),
		effort: z.string().default('normal'),
	})
	.transform((form, context): BeginProposal => {
		const { name, revision: at, cost, goal, compactness, reach, seed, effort } = form;
		const tolerances = tolerancesIn(form, context);
		const read = wishes.safeParse({ tolerances, cost, goal, compactness, reach, seed, effort });
		if (read.success) return { name, revision: at, wishes: read.data };
		for (const { path, message } of read.error.issues) {
			context.addIssue({ code: 'custom', path: [...path], message });
		}
		return z.NEVER;
	});

function tolerancesIn(
	form: Record<string, unknown>,
	context: z.core.$RefinementCtx,
): Record<string, number> {
	const tolerances: Record<string, number> = {};
	for (const [field, value] of Object.entries(form)) {
		const [, id] = percentField.exec(field) ?? [];
		if (id === undefined || String(value).trim() === '') continue;
		const read = percent.safeParse(value);
		if (read.success) tolerances[id] = read.data;
		else {
			const [{ message }] = read.error.issues;
			context.addIssue({ code: 'custom', path: [field], message });
		}
	}
	return tolerances;
}

const proposal = z.coerce.number().int().positive();

/** Forms of a proposal's own page, and the same of the list, where the proposal is a field. */
export const openedNameForm = z.object({
	name: z.string().trim().min(1, 'Give the proposal a name.').max(120),
});
/** `outside`: `yes` when tolerances that are missed are accepted. */
export const openedAdoptForm = z.object({
	revision: z.coerce.number().int().min(0),
	outside: z.literal('yes').optional(),
});
export const proposalForm = z.object({ proposal });
export const renameForm = openedNameForm.extend({ proposal });
export const adoptForm = openedAdoptForm.extend({ proposal });

/** Numbers of the proposals that stand side by side. */
export const comparedNumbers = z
	.array(z.coerce.number().int().positive())
	.max(6)
	.transform((numbers) => [...new Set(numbers)]);
