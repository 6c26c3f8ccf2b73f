/**
 * A coarse picture of a drawing that can be painted in a blink: who owns each cell of a grid over the
 * map, and how wide the lines between owners are. Inks are no part of it, so that one picture serves
 * every colouring of a sheet.
 */
import { boxOfRegion, groundOf, type Area } from '../canvas/ground.ts';
import type { Drawing } from '../drawing.ts';
import { rasterise } from '../labels/region-raster.ts';
import type { Box } from '../plane/fit.ts';

/** From the plainest to the one drawn over the others, as in `lineLayers`. */
export const firstRanks = ['region', 'group', 'outer'] as const;
export type FirstRank = (typeof firstRanks)[number];

export interface FirstLine {
	rank: FirstRank;
	/** hundredths of a millimetre */
	width: number;
	hex: string;
}

export interface FirstPicture {
	/** of the paper */
	widthMm: number;
	heightMm: number;
	/** upper left corner of the grid and side of a cell, hundredths of a millimetre */
	x: number;
	y: number;
	cell: number;
	columns: number;
	rows: number;
	/** region of every cell row by row, -1 for none */
	owner: Int32Array;
	/** a number for the level above of every region: between two of one number no line of groups is drawn */
	group: Uint32Array;
	lines: FirstLine[];
}

/**
 * In: a drawing, and the level above of every region as it was drawn with. Out: the owner of each cell by
 * its middle, at least a fifth of a millimetre to a cell and at most three million cells; widths and
 * colours of the plain ranks of line, without dashes. Names, hatches, water, collar and double lines are
 * left out. Null where nothing is drawn.
 */
export function firstPicture(drawing: Drawing, groups: (string | null)[]): FirstPicture | null {
	const box = mapBox(drawing);
	if (!box) return null;
	const rings = drawing.fills.map((fill) => fill.rings);
	const { cell, columns, rows, owner } = rasterise(drawing, rings, box, () => null);
	return {
		...{ widthMm: drawing.widthMm, heightMm: drawing.heightMm },
		...{ x: box.x, y: box.y, cell, columns, rows, owner },
		group: numbered(groups),
		lines: firstRanks.flatMap((rank) => lineOf(drawing, rank)),
	};
}

/** The regions' box with room for half the widest line around it. */
function mapBox(drawing: Drawing): Box | null {
	const ground = groundOf(drawing);
	const all: Area = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity };
	for (let region = 0; region < drawing.fills.length; region++) {
		const box = boxOfRegion(ground, region);
		if (!box) continue;
		all.left = Math.min(all.left, box.left);
		all.top = Math.min(all.top, box.top);
		all.right = Math.max(all.right, box.right);
		all.bottom = Math.max(all.bottom, box.bottom);
	}
	if (all.left > all.right) return null;
	const air = Math.ceil(Math.max(0, ...drawing.lines.map(({ width }) => width)) / 2) + 20;
	const [x, y] = [all.left - air, all.top - air];
	return { x, y, width: all.right + air - x, height: all.bottom + air - y };
}

function lineOf({ lines }: Drawing, rank: FirstRank): FirstLine[] {
	const line = lines.find((one) => one.rank === rank);
	return line ? [{ rank, width: line.width, hex: line.hex }] : [];
}

function numbered(groups: (string | null)[]): Uint32Array {
	const numbers = new Map<string | null, number>();
	return Uint32Array.from(groups, (group) => {
		const known = numbers.get(group) ?? numbers.size;
		numbers.set(group, known);
		return known;
	});
}
