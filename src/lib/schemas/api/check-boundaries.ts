import { z } from 'zod';
import { finding, regionKey, stats } from './common.ts';

export const border = z.strictObject({
	a: regionKey,
	b: regionKey,
	kind: z.enum(['line', 'point', 'water', 'hand']),
	metres: z
		.number()
		.describe(
			'geodesic length of the shared line; 0 for a point touch; width of a gap across water',
		),
});

export const region = z.strictObject({
	key: regionKey,
	name: z.string(),
	parts: z.int(),
	areaKm2: z.number(),
	enclaveOf: regionKey.nullable(),
});

export const source = z.strictObject({
	format: z.string(),
	layer: z.string().nullable(),
	crs: z.string(),
	encoding: z.string().nullable(),
	features: z.int(),
	toleranceMetres: z.number(),
});

export const boundariesResponse = z.strictObject({
	regions: z.array(region).describe('in file order'),
	borders: z.array(border),
	planar: z.boolean().describe('about the graph of the line borders'),
	findings: z.array(finding),
	source,
	stats,
});
