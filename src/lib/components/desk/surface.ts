import type { Area } from '$lib/engines/sheet';
import type { Drawing, RegionFill } from '$lib/engines/sheet/drawing';

/** A place on the sheet's frame, in pixels. */
export type Place = [x: number, y: number];

/**
 * What shows a sheet and can be changed in place, without a redraw: one inline SVG, or for large sheets a
 * canvas. Marks laid over it are SVG in both cases, in hundredths of a millimetre.
 */
export interface Surface {
	readonly viewBox: string;
	/** the region under a press: what was pressed, and where on the frame; -1 for none */
	regionAt(target: EventTarget | null, at: Place): number;
	/** outline of a region as path data, as fine as it is shown; follows finer lines */
	pathOf(region: number): string;
	/** line along a border as path data; '' where it is a point or a gap */
	borderPath(border: number): string;
	/** box of a region as shares of the paper */
	boxOf(region: number): Area | null;
	/** shows the same sheet in other colours: fills and words that differ, then lettering and legend */
	paint(drawing: Drawing, words: (fill: RegionFill) => string): void;
	/** gives one region a fill and its words */
	tint(region: number, hex: string, words: string): void;
	/** fades every region for which `stays` is false; null fades none */
	fade(stays: ((region: number) => boolean) | null): void;
	/** lays heavy lines along borders; absent where that is left to the marks */
	outline?(borders: readonly number[]): void;
	/** the one stop of the Tab key on the sheet: a region, or the sheet as a whole */
	setStop(region: number | null, focus: boolean): void;
}
