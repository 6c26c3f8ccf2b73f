import { z } from 'zod';
import { plainFrame, type FrameLayout } from '../../engines/sheet/layout/frame.ts';
import { hexColour } from './hex.ts';

const longitude = z.number().min(-180).max(180);
const latitude = z.number().min(-90).max(90);
const moved = z.number().min(-5_000).max(5_000);

const insetChoice = z.strictObject({
	place: z.enum(['frame', 'box', 'out']).nullable(),
	cornerMm: z.tuple([moved, moved]).nullable(),
	ratio: z.number().min(100).max(1e9).nullable(),
	name: z.string().max(80).nullable(),
});

/** Most groups of parts that are decided by hand. */
const mostChoices = 100;

export const frameLayout = z
	.strictObject({
		parallels: z.tuple([latitude, latitude]).nullable(),
		centre: z.tuple([longitude, latitude]).nullable(),
		ratio: z.number().min(100).max(1e9).nullable(),
		shiftMm: z.tuple([moved, moved]),
		insets: z.enum(['none', 'auto']),
		insetChoices: z
			.record(z.string().min(1).max(300), insetChoice)
			.refine((choices) => Object.keys(choices).length <= mostChoices, 'Too many insets.')
			.default({}),
		graticule: z
			.strictObject({
				step: z.union([z.literal('auto'), z.number().min(0.01).max(90)]),
				figures: z.boolean(),
			})
			.nullable(),
		northArrow: z.boolean(),
		neatLine: z.boolean(),
		sea: hexColour.nullable(),
		lakes: hexColour.nullable(),
	})
	.default(plainFrame) satisfies z.ZodType<FrameLayout>;
