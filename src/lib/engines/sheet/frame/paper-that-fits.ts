import type { SheetLayout } from '../layout.ts';
import type { Box } from '../plane/fit.ts';

const sizes = ['A5', 'A4', 'A3', 'A2', 'A1', 'A0'] as const;

/**
 * The smallest paper of the A series on which a map of a size has its place, in words. In: `roomOn`, the
 * box that a layout leaves for the map.
 */
export function paperThatFits(
	size: { widthMm: number; heightMm: number },
	layout: SheetLayout,
	roomOn: (layout: SheetLayout) => Box,
): string {
	const turned = layout.orientation === 'portrait' ? 'landscape' : 'portrait';
	for (const paper of sizes) {
		for (const orientation of [layout.orientation, turned] as const) {
			const { width, height } = roomOn({ ...layout, paper, orientation });
			if (width / 100 >= size.widthMm && height / 100 >= size.heightMm)
				return `${paper} ${orientation} would take it.`;
		}
	}
	return 'No paper up to A0 would take it.';
}
