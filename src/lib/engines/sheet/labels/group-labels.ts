import type { DrawnText } from '../drawing.ts';
import { cleanText } from '../type/clean-text.ts';
import { textWidth } from '../type/text-width.ts';
import { headroom } from './headroom.ts';
import { spotInside } from './inside.ts';
import { linesOfName } from './lines-of-name.ts';
import type { Pole } from './pole.ts';
import { paper, type RegionRaster } from './region-raster.ts';
import { setAt, textBox } from './text-box.ts';

const face = 'serif-bold';
/** A smaller size is tried until this share of the names fits. */
const wanted = 0.85;

/** The raster of regions read as a raster of groups, with the middle of each group's cells. */
function groupRaster(raster: RegionRaster, groupOf: number[], groups: number) {
	const owner = raster.owner.map((region) => (region < 0 ? paper : groupOf[region]));
	const spans = new Int32Array(4 * groups);
	const sums = Array.from({ length: groups }, () => ({ x: 0, y: 0, cells: 0 }));
	for (let group = 0; group < groups; group++) {
		spans.set([raster.columns, -1, raster.rows, -1], 4 * group);
	}
	owner.forEach((group, i) => {
		if (group < 0) return;
		const [column, row] = [i % raster.columns, Math.floor(i / raster.columns)];
		const at = 4 * group;
		spans[at] = Math.min(spans[at], column);
		spans[at + 1] = Math.max(spans[at + 1], column);
		spans[at + 2] = Math.min(spans[at + 2], row);
		spans[at + 3] = Math.max(spans[at + 3], row);
		sums[group].x += column;
		sums[group].y += row;
		sums[group].cells++;
	});
	const middles: Pole[] = sums.map(({ x, y, cells }) => ({
		x: raster.x + raster.cell * (x / cells + 0.5),
		y: raster.y + raster.cell * (y / cells + 0.5),
		radius: 0,
	}));
	return { raster: { ...raster, owner, spans }, middles };
}

/**
 * Names of the level above at one of the sizes, the first that suits, each inside its group and haloed because it crosses several fills.
 * Regions without a group have no name here. Groups whose name finds no room are left out.
 */
export function labelGroups(
	raster: RegionRaster,
	groups: (string | null)[],
	sizes: number[],
): DrawnText[] {
	const names = [...new Set(groups.filter((group) => group !== null))];
	const groupOf = groups.map((group) => (group === null ? paper : names.indexOf(group)));
	const read = groupRaster(raster, groupOf, names.length);
	const room = headroom(read.raster);
	const setIn = (size: number) =>
		names.map((name, group) => {
			const width = (text: string) => textWidth(face, size, text);
			for (const lines of linesOfName(cleanText(name), width)) {
				const box = textBox(lines, face, size);
				const middle = read.middles[group];
				const spot = spotInside(read.raster, room, group, middle, box.width, box.height);
				if (spot) {
					return setAt(box, spot.x, spot.y, { layer: 'label', hex: '#000000', halo: '#ffffff' });
				}
			}
			return [];
		});
	let set: DrawnText[][] = [];
	for (const size of sizes) {
		set = setIn(size);
		if (set.filter((lines) => lines.length).length >= wanted * names.length) break;
	}
	return set.flat();
}
