import { z } from 'zod';
import { sheetLayout } from './draft.ts';

const tick = z.preprocess((value) => value !== undefined && value !== '', z.boolean());

/**
 * The layout as a plain form sends it: ticks are there or not, an own paper size comes as two numbers.
 * It knows the plain fields only and is laid over the stored layout, so that nothing else is touched.
 */
const plainFields = z
	.object({
		title: z.string(),
		subtitle: z.string(),
		paper: z.string(),
		widthMm: z.coerce.number().optional(),
		heightMm: z.coerce.number().optional(),
		/** not sent beside a paper of one's own */
		orientation: z.string().optional(),
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
		paper: paper === 'own' ? { widthMm: widthMm ?? 420, heightMm: heightMm ?? 297 } : paper,
	}));

/** What a plain form may change; the parts that only scripts set are left out. */
export const layoutForm = plainFields.pipe(
	sheetLayout
		.omit({ frame: true, lettering: true, lines: true, collar: true })
		.partial({ orientation: true }),
);

export type LayoutFields = z.infer<typeof layoutForm>;
