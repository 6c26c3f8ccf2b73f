import { z } from 'zod';
import { plainCollar, type CollarLook } from '../../engines/sheet/layout/collar.ts';

const place = z.number().min(-1_000).max(6_000);
const words = z.string().max(120);

const textBlock = z.strictObject({
	text: z.string().max(2_000),
	xMm: place,
	yMm: place,
	widthMm: z.number().min(1).max(5_000),
	sizePt: z.number().min(3).max(144),
	face: z.enum(['sans', 'sans-bold', 'serif', 'serif-bold', 'serif-italic']),
	ground: z.boolean(),
});

export const collarLook = z
	.strictObject({
		legendAt: z.enum(['foot', 'left', 'right', 'corner']),
		legendTitle: z.string().max(200),
		legendColumns: z.int().min(1).max(12).nullable().default(plainCollar.legendColumns),
		legendOrder: z.enum(['number', 'name', 'regions']).default(plainCollar.legendOrder),
		legendCounts: z.boolean(),
		legendLines: z.boolean().default(plainCollar.legendLines),
		lineNames: z
			.strictObject({ outer: words, group: words, region: words })
			.default(plainCollar.lineNames),
		blocks: z.array(textBlock).max(40),
		template: z.strictObject({ id: z.string().max(100), name: z.string().max(200) }).nullable(),
	})
	.default(plainCollar) satisfies z.ZodType<CollarLook>;
