import { z } from 'zod';
import { classMethods, type Theme } from '../engines/measures/theme.ts';

const measure = z.string().min(1).max(400);

export const theme = z
	.strictObject({
		measure,
		per: z.discriminatedUnion('kind', [
			z.strictObject({ kind: z.literal('none') }),
			z.strictObject({ kind: z.literal('area') }),
			z.strictObject({
				kind: z.literal('measure'),
				measure,
				times: z.number().positive().max(1e9),
			}),
		]),
		method: z.enum(classMethods),
		classes: z.int().min(2).max(12),
		breaks: z.array(z.number()).max(11),
		ramp: z.string().min(1).max(100),
		reversed: z.boolean(),
		suppressBelow: z.number().positive().max(1e12).nullable(),
		title: z.string().max(300),
	})
	.nullable()
	.default(null) satisfies z.ZodType<Theme | null>;
