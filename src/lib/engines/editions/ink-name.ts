import type { Draft } from './draft.ts';

/** Name of an ink in a sentence. */
export const inkName = ({ palette }: Pick<Draft, 'palette'>, ink: number): string =>
	palette.inks[ink]?.name || `ink ${ink + 1}`;
