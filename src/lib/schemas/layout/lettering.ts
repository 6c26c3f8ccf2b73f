import { z } from 'zod';
import { plainLettering, type Lettering } from '../../engines/sheet/layout/lettering.ts';

const key = z.string().min(1).max(400);
const place = z.number().min(-1_000).max(6_000);

export const lettering = z
	.strictObject({
		priority: z.enum(['area', 'neighbours']),
		sizePt: z.number().min(3).max(72).nullable(),
		groupNames: z.boolean(),
		abbreviations: z.record(key, z.string().max(40)),
		placed: z.record(key, z.strictObject({ xMm: place, yMm: place })),
		hidden: z.array(key).max(100_000),
		numbers: z.boolean(),
	})
	.default(plainLettering) satisfies z.ZodType<Lettering>;
