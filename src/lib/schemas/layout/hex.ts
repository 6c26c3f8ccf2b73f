import { z } from 'zod';

export const hexColour = z
	.string()
	.regex(/^#[0-9a-f]{6}$/, 'a colour is written #rrggbb in lower case');
