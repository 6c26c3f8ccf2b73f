import { z } from 'zod';
import { classMethods, mostClasses, type Theme } from '../engines/measures/theme.ts';

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
		isRate: z.boolean().default(false),
		method: z.enum(classMethods),
		classes: z.int().min(2).max(mostClasses),
		breaks: z
			.array(z.number())
			.max(mostClasses - 1)
			.refine((breaks) => breaks.every((limit, i) => i === 0 || limit > breaks[i - 1]), {
				message: 'limits of classes must ascend',
			}),
		rounded: z.boolean().default(false),
		ramp: z.string().min(1).max(100),
		reversed: z.boolean(),
		middle: z
			.union([z.literal('mean'), z.number()])
			.nullable()
			.default(null),
		suppressBelow: z.number().positive().max(1e12).nullable(),
		figuresInFiles: z.boolean().optional(),
		title: z.string().max(300),
	})
	.nullable()
	.default(null) satisfies z.ZodType<Theme | null>;
