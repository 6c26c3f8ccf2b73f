import { z } from 'zod';
import { dpiLimits, exportKinds, quantumLimits } from '../engines/exports/kinds.ts';
import type { ExportKindId, SingleKindId } from '../engines/exports/kinds.ts';
import { readers, type Reader } from '../engines/palettes/palette.ts';

/** Files taken of an edition or a draft: what they are asked with and what a page is told of them. */

export const exportStates = ['waiting', 'running', 'done', 'failed', 'cancelled'] as const;
export type ExportState = (typeof exportStates)[number];

const ids = exportKinds.map(({ id }) => id) as [ExportKindId, ...ExportKindId[]];
const singles = ids.filter((id) => id !== 'zip') as [SingleKindId, ...SingleKindId[]];

/** Every option of every kind; a request may say only those that its kind has. */
export const exportChoices = z.strictObject({
	colours: z
		.enum(['class', 'attribute'])
		.optional()
		.describe('svg, svgz: by a style block with a class for each ink, or on every region'),
	letters: z
		.enum(['embedded', 'outlines', 'plain'])
		.optional()
		.describe('svg, svgz: carried inside, drawn as shapes, or left to the reader’s machine'),
	layers: z.boolean().optional().describe('pdf: layers that a viewer can switch off'),
	dpi: z
		.int()
		.min(dpiLimits.least)
		.max(dpiLimits.greatest)
		.optional()
		.describe('png: pixels an inch'),
	ground: z.enum(['white', 'none']).optional().describe('png: white paper, or none'),
	steps: z
		.int()
		.min(quantumLimits.least)
		.max(quantumLimits.greatest)
		.optional()
		.describe('topojson: steps along the longer side of the extent'),
	byteOrderMark: z.boolean().optional().describe('csv: helps spreadsheets to read accents'),
	kinds: z
		.array(z.enum(singles))
		.min(1, 'Tick at least one kind of file for the package.')
		.max(singles.length)
		.optional()
		.describe('zip: which files it holds'),
});
export type ExportChoices = z.output<typeof exportChoices>;

/** Body of `POST /api/v1/sheets/{sheet}/exports`. */
export const askExport = z.strictObject({
	kind: z.enum(ids),
	edition: z
		.int()
		.min(1)
		.nullable()
		.default(null)
		.describe('of this edition; null: of the draft as it stands'),
	reader: z.enum(readers).default('typical').describe('drawn as this kind of reader sees it'),
	options: exportChoices.default({}).describe('those that the kind has; the usual ones otherwise'),
});
export type AskExport = z.output<typeof askExport>;

const chosen = <T extends z.ZodType>(schema: T) =>
	z.preprocess((value) => (value === '' ? undefined : value), schema.optional());

/** The same as a form: what is left empty is as usual. */
export const askExportForm = z
	.object({
		kind: askExport.shape.kind,
		edition: z.preprocess(
			(value) => (value === '' ? null : Number(value)),
			askExport.shape.edition,
		),
		/** the draft that was looked at */
		revision: chosen(z.coerce.number().int().min(1)),
		reader: askExport.shape.reader,
		colours: chosen(z.enum(['class', 'attribute'])),
		letters: chosen(z.enum(['embedded', 'outlines', 'plain'])),
		dpi: chosen(z.coerce.number().pipe(exportChoices.shape.dpi.unwrap())),
		ground: chosen(z.enum(['white', 'none'])),
		// the form of a package says an empty one too, so that none ticked is none and not the usual ones
		kinds: z.preprocess(
			(value) => (value === undefined ? value : [value].flat().filter((one) => one !== '')),
			exportChoices.shape.kinds,
		),
	})
	.transform(({ kind, edition, revision, reader, ...options }) => {
		const asked: AskExport = { kind, edition, reader, options: exportChoices.parse(options) };
		return { asked, revision };
	});

const mostFollowed = 100;
const number = z
	.string()
	.regex(/^[1-9]\d{0,8}$/)
	.transform(Number);

/** `?of=3,5`: how far these are; without it, all that are told. */
export const exportsAsked = z.object({
	of: z
		.string()
		.transform((list) => list.split(','))
		.pipe(z.array(number).max(mostFollowed))
		.optional(),
});

export const exportNumberForm = z.object({ export: z.coerce.number().int().min(1) });

export interface ExportNote {
	number: number;
	state: ExportState;
	kind: ExportKindId;
	/** null: of a draft */
	edition: number | null;
	revision: number;
	reader: Reader;
	/** as asked, each option of the kind said */
	options: Record<string, unknown>;
	step: string;
	/** 0 to 1 */
	share: number;
	/** why there is no file, or what whoever takes it should know */
	sentence: string;
	file: { name: string; mediaType: string; bytes: number; digest: string } | null;
	createdAt: string;
	createdBy: string | null;
	updatedAt: string;
	/** when the file is dropped; null: kept as long as the edition */
	expiresAt: string | null;
}

/** The same for a page, which offers to stop it. */
export interface DeskExport extends ExportNote {
	/** whether whoever looks may stop it, while it is open */
	mayStop: boolean;
}

export const isOpenExport = ({ state }: Pick<ExportNote, 'state'>): boolean =>
	state === 'waiting' || state === 'running';
