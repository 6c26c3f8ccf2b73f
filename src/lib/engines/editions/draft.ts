import type { Ink } from '../palettes/palette.ts';
import type { SheetLayout } from '../sheet/layout.ts';

/**
 * Everything about a sheet that people decide, kept whole at every save so that any earlier state can
 * be read again. Regions are named by their key. The colouring is computed from it, never typed in.
 */
export interface Draft {
	inks: number | 'fewest';
	palette: { id: string; name: string; inks: Ink[] };
	/** region key -> pinned ink (number from 0), what dropping it costs, and who set it when */
	locks: Record<string, { ink: number; cost: number; by?: string; at?: string }>;
	forbidden: { key: string; ink: number }[];
	alike: [string, string][];
	apart: [string, string][];
	/** whether regions that meet in a point only must differ */
	pointTouches: boolean;
	/** a shared line shorter than this does not count, in metres; 0: every line does */
	leastMetres: number;
	/** pairs across water count up to this gap, in kilometres; 0: none; null: as the file was read */
	waterKm: number | null;
	/** borders struck out by hand, with the reason */
	struck: HandBorder[];
	/** borders added by hand, with the reason */
	added: HandBorder[];
	seed: number;
	layout: SheetLayout;
}

/** A pair of regions decided by hand: why, by whom and when. */
export interface HandBorder {
	a: string;
	b: string;
	reason: string;
	by?: string;
	at?: string;
}

/** What a document says that was written before these were asked. */
const unasked = { leastMetres: 0, waterKm: null };

/** A stored document as a draft of today: what it does not say yet is as it was before it could be said. */
export const wholeDraft = (
	document: Omit<Draft, keyof typeof unasked> & Partial<Pick<Draft, keyof typeof unasked>>,
): Draft => ({ ...unasked, ...document });
