import type { DrawnText } from '../drawing.ts';
import { cleanText } from '../type/clean-text.ts';
import { textWidth } from '../type/text-width.ts';
import { blockOut } from './block-out.ts';
import type { LabelInput } from './label-sheet.ts';
import { headroom } from './headroom.ts';
import { spotInside } from './inside.ts';
import { linesOfName } from './lines-of-name.ts';
import type { Pole } from './pole.ts';
import { rasterise, type RegionRaster } from './region-raster.ts';
import { setAt, textBox } from './text-box.ts';

const face = 'serif-bold';
/** A smaller size is tried until this share of the names fits. */
const wanted = 0.85;

/** The middle of the cells of each owner. */
function middlesOf({ owner, columns, x, y, cell }: RegionRaster, groups: number): Pole[] {
	const sums = Array.from({ length: groups }, () => ({ x: 0, y: 0, cells: 0 }));
	owner.forEach((group, i) => {
		if (group < 0) return;
		sums[group].x += i % columns;
		sums[group].y += Math.floor(i / columns);
		sums[group].cells++;
	});
	return sums.map((sum) => ({
		x: x + cell * (sum.x / sum.cells + 0.5),
		y: y + cell * (sum.y / sum.cells + 0.5),
		radius: 0,
	}));
}

/**
 * Names of the level above at one of the sizes, the first that suits, each inside its group and haloed because it crosses several fills.
 * Regions without a group have no name here. Groups whose name finds no room are left out.
 */
export function labelGroups(
	{ arcs, rings, sides, groups, box, obstacles }: Omit<LabelInput, 'names' | 'areas' | 'scale'>,
	sizes: number[],
): DrawnText[] {
	const names = [...new Set(groups.filter((group) => group !== null))];
	const members = names.map((name) => rings.filter((_, region) => groups[region] === name).flat());
	const groupAt = (region: number) => (region < 0 ? undefined : groups[region]);
	const raster = rasterise(
		arcs,
		members,
		box,
		(arc) => groupAt(sides.arcLeft[arc]) !== groupAt(sides.arcRight[arc]),
	);
	const middles = middlesOf(raster, names.length);
	blockOut(raster, obstacles);
	const room = headroom(raster);
	const setIn = (size: number) =>
		names.map((name, group) => {
			const width = (text: string) => textWidth(face, size, text);
			for (const lines of linesOfName(cleanText(name), width)) {
				const set = textBox(lines, face, size);
				const middle = middles[group];
				const spot = spotInside(raster, room, group, middle, set.width, set.height);
				if (spot) {
					return setAt(set, spot.x, spot.y, { layer: 'label', hex: '#000000', halo: '#ffffff' });
				}
			}
			return [];
		});
	let labels: DrawnText[][] = [];
	for (const size of sizes) {
		labels = setIn(size);
		if (labels.filter((lines) => lines.length).length >= wanted * names.length) break;
	}
	return labels.flat();
}
