import { z } from 'zod';

/** The fields that may stand beside a file of boundaries, on the upload page and in the API alike. */

const blankIsAbsent = (value: unknown) =>
	typeof value === 'string' && value.trim() === '' ? undefined : value;
const text = (most: number) => z.preprocess(blankIsAbsent, z.string().max(most).optional());
const decimal = (most: number) =>
	z.preprocess(
		(value) => (blankIsAbsent(value) === undefined ? undefined : Number(value)),
		z.number().min(0).max(most).optional(),
	);

export const readingFields = z.strictObject({
	layer: text(400),
	keyField: text(400),
	nameField: text(400),
	crs: text(2_000),
	axes: z.preprocess(blankIsAbsent, z.enum(['lonlat', 'latlon']).optional()),
	toleranceMetres: decimal(100_000),
	acrossWaterKm: decimal(1_000),
	duplicateKeys: z.preprocess(blankIsAbsent, z.enum(['refuse', 'merge', 'rename']).optional()),
});
/** How a file is to be read; everything absent is decided from the file. */
export type ReadingFields = z.infer<typeof readingFields>;

export const uploadFields = readingFields.extend({ sheetName: text(200) });
export type UploadFields = z.infer<typeof uploadFields>;
