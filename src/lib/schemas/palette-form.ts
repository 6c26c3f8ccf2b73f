import { z } from 'zod';
import { readHex } from '../engines/colour/hex.ts';
import type { Hatch, Ink } from '../engines/palettes/palette.ts';
import { ink } from './draft.ts';

export const mostInks = 64;
const name = z.string().trim().min(1, 'Give the palette a name.').max(120, 'The name is too long.');

/** One ink as the rows of the form send it. */
export interface InkRow {
	name: string;
	hex: string;
	fixed: string;
	hatch: string;
	angle: string;
	spacing: string;
	width: string;
	line: string;
}

const columns = ['name', 'hex', 'fixed', 'hatch', 'angle', 'spacing', 'width', 'line'] as const;

/** The rows of a palette form, each field sent once a row; rows without a value and a name are left out. */
export function inkRows(form: FormData): InkRow[] {
	const sent = columns.map((column) => form.getAll(`ink-${column}`).map(String));
	const rows = Math.min(mostInks + 1, ...sent.map((all) => all.length));
	return Array.from({ length: rows }, (_, row) => {
		const entries = columns.map((column, c) => [column, sent[c][row].slice(0, 200)]);
		return Object.fromEntries(entries) as InkRow;
	}).filter((row) => row.hex.trim() || row.name.trim());
}

const rowShape = z.object(
	Object.fromEntries(columns.map((column) => [column, z.string()])) as Record<
		keyof InkRow,
		z.ZodString
	>,
);

/** Name and rows of a palette that is typed, as inks; faults name the row. */
export const typedPalette = z.object({
	name,
	rows: z
		.array(rowShape)
		.min(1, 'A palette has one ink at least.')
		.max(mostInks, `A palette has at most ${mostInks} inks.`)
		.transform((rows, context): Ink[] =>
			rows.map((row, number) => {
				const read = inkOf(row, number);
				if ('fault' in read) {
					context.addIssue(`Ink ${number + 1}: ${read.fault}`);
					return { name: row.name, hex: '#000000' };
				}
				return read;
			}),
		),
});

function inkOf(row: InkRow, number: number): Ink | { fault: string } {
	const hex = readHex(row.hex.trim());
	if (!hex) return { fault: `“${row.hex}” is not a colour: write # and six hex digits.` };
	const hatch = hatchOf(row);
	if (hatch && 'fault' in hatch) return hatch;
	const read = ink.safeParse({
		name: row.name.trim() || `Ink ${number + 1}`,
		hex,
		...(hatch ? { hatch } : {}),
		...(row.fixed === 'yes' ? { fixed: true } : {}),
	});
	if (read.success) return read.data;
	return {
		fault:
			'a name has 80 letters at most; a hatch an angle of 0 to 179 degrees, lines 0.05 to 10 mm wide and 0.4 to 50 mm apart.',
	};
}

function hatchOf({ hatch, angle, spacing, width, line }: InkRow): Hatch | null | { fault: string } {
	if (hatch !== 'lines' && hatch !== 'crossed') return null;
	const hex = readHex(line.trim() || '#000000');
	if (!hex) return { fault: `the colour of its hatch, “${line}”, is not a colour.` };
	const [turn, apart, wide] = [angle, spacing, width].map((text) => Number(text.replace(',', '.')));
	if (![turn, apart, wide].every(Number.isFinite) || !spacing.trim() || !width.trim())
		return { fault: 'its hatch needs an angle, a spacing and a width in numbers.' };
	return { kind: hatch, angle: turn, spacingMm: apart, widthMm: wide, hex };
}

/** Inks as rows, to be shown in the form. */
export const rowsOf = (inks: readonly Ink[]): InkRow[] =>
	inks.map(({ name: called, hex, fixed, hatch }) => ({
		...{ name: called, hex, fixed: fixed ? 'yes' : 'no', hatch: hatch?.kind ?? 'none' },
		...{ angle: String(hatch?.angle ?? 45), spacing: String(hatch?.spacingMm ?? 2) },
		...{ width: String(hatch?.widthMm ?? 0.25), line: hatch?.hex ?? '#000000' },
	}));

/** What a change was made from. */
export const revisionField = z.coerce
	.number()
	.int()
	.min(1)
	.max(2 ** 31 - 1);

/** A sheet's palette that is kept as one of the team's: under a name, or over one that there is. */
export const keptPalette = z.object({
	name: name.optional().or(z.literal('')),
	over: z.uuid().optional().or(z.literal('')),
	/** of the palette that it is kept over, as the page showed it */
	revision: revisionField.optional().or(z.literal('')),
	inks: z
		.string()
		.max(50_000)
		.transform((text, context) => {
			const read = z.array(ink).min(1).max(mostInks).safeParse(parsed(text));
			if (read.success) return read.data;
			context.addIssue('The inks of the sheet could not be read.');
			return z.NEVER;
		}),
});

function parsed(text: string): unknown {
	try {
		return JSON.parse(text);
	} catch {
		return null;
	}
}

export const approvalForm = z.object({ id: z.uuid(), digest: z.string().regex(/^[0-9a-f]{64}$/) });
