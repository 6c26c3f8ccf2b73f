import { z } from 'zod';

/** Pieces that several routes of the API share. Descriptions go into the API's own description. */

export const regionKey = z.string().min(1).max(400).describe('key of a region');
export const inkNumber = z.int().min(0).max(65_534).describe('number of an ink, from 0');
export const pair = z.tuple([regionKey, regionKey]);
export const hex = z
	.string()
	.regex(/^#[0-9a-fA-F]{6}$/)
	.describe('sRGB as #rrggbb');

export const stats = z.strictObject({
	milliseconds: z.number().min(0).describe('for the computing alone'),
});

export const place = z
	.tuple([z.number(), z.number()])
	.nullable()
	.describe('longitude and latitude in degrees');

export const finding = z.strictObject({
	code: z.string(),
	severity: z.enum(['error', 'warning', 'note']),
	message: z.string(),
	regions: z.array(regionKey),
	at: place,
});

export const errorBody = z.strictObject({
	error: z.strictObject({
		code: z.string(),
		message: z.string(),
		details: z.record(z.string(), z.unknown()).optional(),
	}),
});

export const moment = z.iso.datetime().describe('ISO 8601, universal time');
export const digest = z
	.string()
	.regex(/^[0-9a-f]{64}$/)
	.describe('SHA-256, hexadecimal');
