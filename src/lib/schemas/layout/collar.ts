import { z } from 'zod';
import { plainCollar, type CollarLook } from '../../engines/sheet/layout/collar.ts';

const place = z.number().min(-1_000).max(6_000);

export const collarLook = z
	.strictObject({
		legendAt: z.enum(['foot', 'left', 'right']),
		legendTitle: z.string().max(200),
		legendCounts: z.boolean(),
		blocks: z
			.array(
				z.strictObject({
					text: z.string().max(2_000),
					xMm: place,
					yMm: place,
					widthMm: z.number().min(1).max(5_000),
					sizePt: z.number().min(3).max(144),
					face: z.enum(['sans', 'sans-bold', 'serif', 'serif-bold', 'serif-italic']),
					ground: z.boolean(),
				}),
			)
			.max(40),
		template: z.strictObject({ id: z.string().max(100), name: z.string().max(200) }).nullable(),
	})
	.default(plainCollar) satisfies z.ZodType<CollarLook>;
