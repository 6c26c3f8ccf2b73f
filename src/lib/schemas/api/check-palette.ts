import { z } from 'zod';
import { readers } from '../../engines/colour/reader.ts';
import { hex, stats } from './common.ts';

const ink = z.int().min(0).max(63);

export const paletteRequest = z.strictObject({
	inks: z.array(hex).min(1).max(64),
	touching: z
		.union([z.array(z.tuple([ink, ink])).max(4_096), z.literal('all')])
		.default('all')
		.describe('pairs of inks that touch on the sheet'),
	locked: z.array(ink).default([]).describe('inks that a mend leaves as they are'),
	thresholds: z
		.strictObject({
			ciede2000: z.number().min(0).max(100),
			grey: z.number().min(0).max(100),
			label: z.number().min(1).max(21),
		})
		.partial()
		.default({}),
	mend: z.boolean().default(false),
	seed: z.int().min(0).max(0xffffffff).default(0),
});
export type PaletteRequest = z.infer<typeof paletteRequest>;

export const paletteResponse = z.strictObject({
	pairs: z.array(
		z.strictObject({
			a: ink,
			b: ink,
			reader: z.enum(readers),
			ciede2000: z.number(),
			contrast: z.number(),
			greyGap: z.number(),
			passes: z.boolean(),
		}),
	),
	labels: z.array(
		z.strictObject({
			ink,
			label: z.enum(['#000000', '#ffffff']),
			contrast: z.number(),
			passes: z.boolean(),
		}),
	),
	passes: z.boolean(),
	mend: z
		.strictObject({
			status: z.enum(['mended', 'not-needed', 'impossible', 'not-found']),
			inks: z.array(hex),
			moves: z.array(z.number()).describe('how far each ink moved, CIEDE2000'),
			reason: z.string().optional(),
		})
		.nullable(),
	stats,
});
