import { z } from 'zod';
import { sheetLayout } from './draft.ts';

const tick = z.preprocess((value) => value !== undefined && value !== '', z.boolean());

/** The layout as a plain form sends it: ticks are there or not, an own paper size comes as two numbers. */
export const layoutForm = z
	.object({
		title: z.string(),
		subtitle: z.string(),
		paper: z.string(),
		widthMm: z.coerce.number().optional(),
		heightMm: z.coerce.number().optional(),
		orientation: z.string().default('landscape'),
		marginMm: z.coerce.number(),
		projection: z.string(),
		groupColumn: z.string().transform((column) => column || null),
		labels: tick,
		legend: tick,
		scaleBar: tick,
		credits: z.string(),
	})
	.transform(({ paper, widthMm, heightMm, ...plain }) => ({
		...plain,
		paper: paper === 'own' ? { widthMm, heightMm } : paper,
	}))
	.pipe(sheetLayout);
