import type { Leader } from './leader.ts';
import type { TextBox } from './text-box.ts';

/**
 * How the name of a region is set: `inside` it; `over` its border, the most of it inside; `beside` it or
 * by a `leader` on empty paper; by `hand`; as a `number` that the list on the sheet explains. Else it is
 * in the table only: `listed` for want of room, `letters` because the fonts lack some, `nameless`
 * without a name, `hidden` because somebody asked for it, `off` where no names are set at all.
 */
export type HowNamed =
	| 'inside'
	| 'over'
	| 'beside'
	| 'leader'
	| 'hand'
	| 'number'
	| 'listed'
	| 'letters'
	| 'nameless'
	| 'hidden'
	| 'off';

/** A name, or the number in its place, that stands on the sheet. */
export interface SetName {
	region: number;
	how: HowNamed;
	/** whether the abbreviation is set */
	short: boolean;
	box: TextBox;
	/** middle of the box */
	x: number;
	y: number;
	/** `fill`: on its region; `edge`: partly on others, with a halo of its region's; `paper`: on paper; `others`: with a white halo */
	ground: 'fill' | 'edge' | 'paper' | 'others';
	leader: Leader | null;
}

/** What a drawing tells of its lettering, beside the texts. */
export interface DrawnLettering {
	/** in region order */
	how: HowNamed[];
	/** the number that stands for a name; 0 for none */
	numbers: Uint32Array;
	/** 1 where the abbreviation is set */
	short: Uint8Array;
	/** x, y of the place from which a name set by hand is measured; `noAnchor` for a region not drawn */
	anchors: Int32Array;
	/** type size in points: of regions, of the level above; null where not named */
	points: { regions: number | null; groups: number | null };
	/** sentences about what is not as it should be */
	notes: string[];
}

export const noAnchor = -(2 ** 31);

/** Whether the sheet itself says a region's name. */
export const isOnSheet = (how: HowNamed): boolean =>
	['inside', 'over', 'beside', 'leader', 'hand', 'number'].includes(how);
