import { z } from 'zod';
import { plainLines, type LineLook } from '../../engines/sheet/layout/lines.ts';
import { hexColour } from './hex.ts';

const rank = z
	.strictObject({
		widthMm: z.number().min(0.02).max(5),
		hex: hexColour,
		dashMm: z.array(z.number().min(0.05).max(50)).max(8),
	})
	.nullable();

export const lineLook = z
	.strictObject({ outer: rank, group: rank, region: rank, doubleWeak: z.boolean() })
	.default(plainLines) satisfies z.ZodType<LineLook>;
