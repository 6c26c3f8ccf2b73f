import { z } from 'zod';

/** What people and programs send about tables of figures. */

const blankIsAbsent = (value: unknown) =>
	typeof value === 'string' && value.trim() === '' ? undefined : value;
const text = (most: number) => z.preprocess(blankIsAbsent, z.string().max(most).optional());

/** How a table is to be read; everything absent is found out from the file. */
export const tableReading = z.strictObject({
	sheet: text(200),
	delimiter: z.preprocess(
		(value) => (value === '' ? undefined : value === 'tab' ? '\t' : value),
		z.enum([',', ';', '\t', '|'], 'Choose one of the signs offered.').optional(),
	),
	encoding: z.preprocess(
		blankIsAbsent,
		z.enum(['utf-8', 'utf-16le', 'utf-16be', 'windows-1252', 'windows-1250']).optional(),
	),
	decimal: z.preprocess(blankIsAbsent, z.enum(['.', ',']).optional()),
	headingRow: z.preprocess(
		(value) => (blankIsAbsent(value) === undefined ? undefined : Number(value)),
		z
			.int('Give the number of a row, or 0 when the table has no headings.')
			.min(0)
			.max(1_000)
			.optional(),
	),
	headingRows: z.preprocess(
		(value) => (blankIsAbsent(value) === undefined ? undefined : Number(value)),
		z.union([z.literal(1), z.literal(2)]).optional(),
	),
});
export type TableReading = z.infer<typeof tableReading>;

/** Fields beside an uploaded table. */
export const tableFields = tableReading.extend({ name: text(200) });

/** Which column names the regions, and by what. */
export const joinForm = z.object({
	column: z.coerce.number().int().min(0).max(499),
	by: z.enum(['key', 'name'], 'Say whether it holds keys or names.'),
});

const anyFields = z.record(z.string(), z.union([z.string(), z.array(z.string())]));
type Fields = z.infer<typeof anyFields>;
const said = (fields: Fields, name: string): string => String(fields[name] ?? '').trim();

/** Numbers at the end of the fields that begin so: `take-3` is 3. */
function numbered(fields: Fields, start: string): number[] {
	const found = Object.keys(fields).flatMap((name) => {
		const [, digits] = /^([0-9]{1,7})$/.exec(name.slice(start.length)) ?? [];
		return name.startsWith(start) && digits ? Number(digits) : [];
	});
	return [...new Set(found)].sort((a, b) => a - b);
}

/** One page of rows: `decide-12` is empty, `out` or `key:...`; `other-12` is a key or a name typed. */
export const decisionsForm = anyFields.transform((fields) =>
	numbered(fields, 'decide-').flatMap((row): { row: number; region: string | null }[] => {
		const typed = said(fields, `other-${row}`);
		const chosen = said(fields, `decide-${row}`);
		if (typed) return [{ row, region: typed }];
		if (chosen === 'out') return [{ row, region: null }];
		return chosen.startsWith('key:') ? [{ row, region: chosen.slice(4) }] : [];
	}),
);
export type Decision = z.infer<typeof decisionsForm>[number];

export const sweepForm = z.object({
	what: z.enum(['take-first', 'leave-out-rest', 'take-back', 'take-back-all']),
	row: z.coerce.number().int().min(0).max(9_999_999).optional(),
});
export type Sweep = z.infer<typeof sweepForm>;

const columnRules = z.object({
	name: z
		.string()
		.min(1, 'Give the measure a name.')
		.max(200, 'Use at most 200 characters for the name.'),
	unit: z.string().max(40, 'Use at most 40 characters for the unit.'),
	kind: z.enum(['number', 'text']),
	doubled: z.enum(['sum', 'first', 'last', 'refuse']),
	empty: z.enum(['missing', 'zero']),
	notNumber: z.enum(['refuse', 'missing']),
	negative: z.enum(['refuse', 'keep', 'missing']),
});

/** The columns to take, each with its name, unit, kind and rules: `take-3`, `name-3`, `unit-3` and so on. */
export const columnsForm = anyFields.transform((fields, context) => {
	const names = new Map<string, number>();
	const columns = numbered(fields, 'take-').flatMap((column) => {
		const sent = Object.keys(columnRules.shape).map((field) => [
			field,
			said(fields, `${field}-${column}`),
		]);
		const read = columnRules.safeParse(Object.fromEntries(sent));
		for (const { path, message } of read.error?.issues ?? []) {
			context.addIssue({ code: 'custom', path: [`${String(path[0])}-${column}`], message });
		}
		if (!read.success) return [];
		if (names.has(read.data.name)) {
			const message = 'Another column is to have this name as well.';
			context.addIssue({ code: 'custom', path: [`name-${column}`], message });
		}
		names.set(read.data.name, column);
		return { column, ...read.data };
	});
	const existing = said(fields, 'existing') === 'add' ? ('add' as const) : ('replace' as const);
	return { columns, existing };
});

/** A tick that is not set is not sent. */
export const takeForm = z.object({ confidential: z.string().optional() });
export const measureForm = z.object({ measure: z.uuid() });
