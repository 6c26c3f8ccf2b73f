import { z } from 'zod';
import type { Palette } from '../engines/palettes/palette.ts';
import type { LayoutTemplate, TemplateDifference } from '../engines/sheet/layout/template.ts';

const name = z
	.string()
	.trim()
	.min(1, 'Give the template a name.')
	.max(120, 'A name of a template has 120 letters at most.');
const tick = z.preprocess((value) => value !== undefined && value !== '', z.boolean());
const whole = z.coerce
	.number()
	.int()
	.min(1)
	.max(2 ** 31 - 1);

/** What goes with the layout, where sheets of a series are to share it. */
const shared = { ratio: tick, palette: tick };

export const newTemplate = z.object({ name, ...shared });
export const templateId = z.object({ id: z.uuid() });
export const templateRename = z.object({ id: z.uuid(), revision: whole, name });
export const templateReplace = z.object({ id: z.uuid(), revision: whole, ...shared });
export const templateUse = z.object({ id: z.uuid(), revision: whole });
/** Sheets come as `number:revision`, one tick each. */
export const templateAlike = z.object({
	id: z.uuid(),
	sheets: z.preprocess(
		(value) => (value === undefined ? [] : Array.isArray(value) ? value : [value]),
		z
			.array(
				z
					.string()
					.regex(/^[1-9]\d{0,9}:[1-9]\d{0,9}$/)
					.transform((text) => {
						const [number, revision] = text.split(':').map(Number);
						return { number, revision };
					}),
			)
			.min(1, 'Tick at least one sheet.')
			.max(200),
	),
});

/** A template as the layout stage lists it. */
export interface TemplateView {
	id: string;
	name: string;
	revision: number;
	updatedAt: string;
	fields: LayoutTemplate;
	ratio: number | null;
	palette: Palette | null;
	/** sheets that were set by it, as they stand now */
	sheets: SeriesSheet[];
}

export interface SeriesSheet {
	number: number;
	name: string;
	revision: number;
	differs: TemplateDifference[];
}

export type AlikeOutcome = 'set' | 'same' | 'stale' | 'gone';
export interface AlikeResult {
	number: number;
	outcome: AlikeOutcome;
	/** who saved first, where it is stale */
	by: string | null;
}
