import type { DrawnText } from '../drawing.ts';
import type { ArcSides } from '../lines.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';
import { cleanText } from '../type/clean-text.ts';
import { isSetIn, textWidth } from '../type/text-width.ts';
import { headroom } from './headroom.ts';
import { spotInside } from './inside.ts';
import { linesOfName } from './lines-of-name.ts';
import type { Pole } from './pole.ts';
import { outline, rasterise, type RegionRaster } from './region-raster.ts';
import { setAt, textBox } from './text-box.ts';

const face = 'serif-bold';
/** A smaller size is tried until this share of the names fits. */
const wanted = 0.85;
/** Between spaced capitals, in parts of the type size. Source: Imhof 1975, spaced names for areas. */
const spacing = 0.35;
/** Clear above and below spaced capitals together, in parts of their size, so that they read as one. */
const air = 0.8;

export interface GroupInput {
	arcs: SheetArcs;
	rings: Int32Array[][];
	sides: ArcSides;
	groups: (string | null)[];
	box: Box;
}

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

/** Capitals as they are cut for signs: Greek ones have no accent. */
function capitals(name: string): string {
	const upper = name.toUpperCase();
	if (!/\p{Script=Greek}/u.test(upper)) return upper;
	return upper
		.normalize('NFD')
		.replace(/\u0301/g, '')
		.normalize('NFC');
}

export interface GroupNames {
	texts: DrawnText[];
	/** type size that was used */
	size: number;
	/** share of the groups that are named */
	share: number;
}

/**
 * Names of the level above at one of the sizes, the first that suits, each inside its group and haloed
 * because it crosses several fills; over nothing that is `busy`. `spaced`: in spaced capitals, between
 * the names of regions. Regions without a group have no name here; groups whose name finds no room, or
 * has letters that the fonts lack, are left out.
 */
export function labelGroups(
	{ arcs, rings, sides, groups, box }: GroupInput,
	sizes: number[],
	busy: Uint8Array | undefined,
	spaced: boolean,
): GroupNames {
	const names = [...new Set(groups.filter((group) => group !== null))];
	const members = names.map((name) => rings.filter((_, region) => groups[region] === name).flat());
	const groupAt = (region: number) => (region < 0 ? undefined : groups[region]);
	const raster = rasterise(arcs, members, box, (arc) =>
		groupAt(sides.arcLeft[arc]) !== groupAt(sides.arcRight[arc]) ? outline : null,
	);
	const room = headroom(raster, busy);
	const middles = middlesOf(raster, names.length);
	const said = names.map((name) => (spaced ? capitals(cleanText(name)) : cleanText(name)));
	const setIn = (size: number) => {
		const apart = spaced ? Math.round(size * spacing) : 0;
		const width = (text: string) => textWidth(face, size, text) + apart * text.length;
		return said.map((name, group): DrawnText[] => {
			if (!isSetIn(face, name)) return [];
			for (const lines of linesOfName(name, width)) {
				const set = textBox(lines, face, size, apart);
				const pole = middles[group];
				const [wide, high] = [set.width + size / 2, set.height + (spaced ? size * air : 0)];
				const spot = spotInside(raster, room, group, pole, wide, high);
				if (!spot) continue;
				const rest = { layer: 'label', hex: '#000000', halo: '#ffffff' } as const;
				return setAt(set, spot.x, spot.y, { ...rest, ...(apart ? { spacing: apart } : {}) });
			}
			return [];
		});
	};
	let labels: DrawnText[][] = [];
	let [size, share] = [0, 0];
	for (size of sizes) {
		labels = setIn(size);
		share = labels.filter((lines) => lines.length).length / Math.max(1, names.length);
		if (share >= wanted) break;
	}
	return { texts: labels.flat(), size, share };
}
