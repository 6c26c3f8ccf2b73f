import type { Coverage } from '../boundaries/coverage.ts';
import type { Ink } from '../palettes/palette.ts';
import { arrange } from './arrange.ts';
import type { SheetLayout } from './layout.ts';
import { smallerSide } from './smaller-side.ts';

/**
 * How large every region shows on the sheet: the smaller side, in mm, of the bounding box of its
 * largest part. For the palette check, where small areas ask for colours further apart. 0 for a
 * region too small to be drawn. A legend takes of the map's room unless it finds an empty corner, so
 * `inks` are those that the sheet is drawn with; none for a sheet that is not coloured.
 */
export function regionSizesMm(
	coverage: Coverage,
	layout: SheetLayout,
	inks: readonly Ink[] = [],
): Float64Array {
	const { placed } = arrange(
		{
			...{ coverage, layout, groups: coverage.keys.map(() => null), weak: [], issue: '' },
			colouring: inks.length ? new Int32Array(coverage.keys.length) : null,
		},
		inks.map((ink) => ({ ...ink, shown: ink.hex })),
	);
	const { arcs, rings } = placed;
	return Float64Array.from(rings, (list) => smallerSide(arcs, list) / 100);
}
