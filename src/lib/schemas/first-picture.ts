import { z } from 'zod';

/** `?tag=` of a sheet's first picture. */
export const pictureTag = z.string().regex(/^[0-9a-f]{32}$/);
