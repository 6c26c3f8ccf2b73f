import { z } from 'zod';

/** `?level=` of a sheet's geometry: 1 is the coarsest; absent for the full geometry. */
export const displayLevel = z
	.string()
	.regex(/^[1-9]\d?$/)
	.transform(Number)
	.nullable();
