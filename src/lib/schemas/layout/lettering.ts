import { z } from 'zod';
import { plainLettering, type Lettering } from '../../engines/sheet/layout/lettering.ts';

const key = z.string().min(1).max(400);
const keys = z.array(key).max(100_000);
/** from the anchor of a region, in mm: no sheet is larger */
const away = z.number().min(-5_000).max(5_000);
const points = z.number().min(3).max(72).nullable();

const placed = z.strictObject({
	dxMm: away,
	dyMm: away,
	lines: z.literal([1, 2, 3]).nullable(),
	short: z.boolean(),
});

export const lettering = z
	.strictObject({
		priority: z.enum(['area', 'neighbours']),
		first: keys,
		sizePt: points,
		groupSizePt: points,
		groupNames: z.boolean(),
		nameColumn: z.string().max(400).nullable(),
		abbreviations: z.record(key, z.string().min(1).max(40)),
		placed: z.record(key, placed),
		hidden: keys,
		numbers: z.boolean(),
	})
	.default(plainLettering) satisfies z.ZodType<Lettering>;
