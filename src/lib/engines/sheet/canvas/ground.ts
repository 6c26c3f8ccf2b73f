import { ringsPath } from '../svg/path-data.ts';
import type { Drawing } from '../drawing.ts';
import type { SheetArcs } from '../plane/quantise.ts';

/**
 * The geometry of a drawing in flat arrays, which threads hand to each other without copying trees of
 * objects. Lengths are hundredths of a millimetre on the paper, as in `Drawing`.
 */
export interface Ground extends SheetArcs {
	/** signed arcs of all rings in turn */
	ringArcs: Int32Array;
	/** rings + 1 */
	ringStarts: Uint32Array;
	/** regions + 1: first ring of each region */
	regionRings: Uint32Array;
	/** left, top, right, bottom of every region; left above right where nothing is drawn */
	regionBoxes: Int32Array;
	arcBoxes: Int32Array;
}

/** A part of the paper in hundredths of a millimetre. */
export interface Area {
	left: number;
	top: number;
	right: number;
	bottom: number;
}

/** The ground of a drawing; its points are those of the drawing, not copied. */
export function groundOf({ arcPoints, arcStarts, fills }: Drawing): Ground {
	const rings = fills.flatMap((fill) => fill.rings);
	const regionRings = new Uint32Array(fills.length + 1);
	fills.forEach((fill, i) => (regionRings[i + 1] = regionRings[i] + fill.rings.length));
	const ringStarts = new Uint32Array(rings.length + 1);
	rings.forEach((ring, i) => (ringStarts[i + 1] = ringStarts[i] + ring.length));
	const ringArcs = new Int32Array(ringStarts[rings.length]);
	rings.forEach((ring, i) => ringArcs.set(ring, ringStarts[i]));
	return withBoxes({ arcPoints, arcStarts, ringArcs, ringStarts, regionRings });
}

/** The same rings over other arcs, with the boxes measured anew. */
export function withBoxes(shape: Omit<Ground, 'regionBoxes' | 'arcBoxes'>): Ground {
	const arcBoxes = boxesOfArcs(shape);
	const { ringArcs, ringStarts, regionRings } = shape;
	const regionBoxes = emptyBoxes(regionRings.length - 1);
	for (let region = 0; region + 1 < regionRings.length; region++) {
		const end = ringStarts[regionRings[region + 1]];
		for (let i = ringStarts[regionRings[region]]; i < end; i++) {
			const arc = ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i];
			for (let side = 0; side < 4; side += 2) {
				widen(regionBoxes, region, arcBoxes[4 * arc + side], arcBoxes[4 * arc + side + 1]);
			}
		}
	}
	return { ...shape, regionBoxes, arcBoxes };
}

function boxesOfArcs({ arcPoints, arcStarts }: SheetArcs): Int32Array {
	const boxes = emptyBoxes(arcStarts.length - 1);
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		for (let i = arcStarts[arc]; i < arcStarts[arc + 1]; i++)
			widen(boxes, arc, arcPoints[2 * i], arcPoints[2 * i + 1]);
	}
	return boxes;
}

const far = 2 ** 31 - 1;

function emptyBoxes(count: number): Int32Array {
	const boxes = new Int32Array(4 * count);
	for (let i = 0; i < boxes.length; i++) boxes[i] = i % 4 < 2 ? far : -far;
	return boxes;
}

function widen(boxes: Int32Array, item: number, x: number, y: number): void {
	const at = 4 * item;
	if (x < boxes[at]) boxes[at] = x;
	if (y < boxes[at + 1]) boxes[at + 1] = y;
	if (x > boxes[at + 2]) boxes[at + 2] = x;
	if (y > boxes[at + 3]) boxes[at + 3] = y;
}

/** Whether a box of `regionBoxes` or `arcBoxes` meets an area. */
export const meets = (boxes: Int32Array, item: number, area: Area): boolean =>
	boxes[4 * item] <= area.right &&
	boxes[4 * item + 2] >= area.left &&
	boxes[4 * item + 1] <= area.bottom &&
	boxes[4 * item + 3] >= area.top;

/** Box of a region; null where nothing of it is drawn. */
export function boxOfRegion({ regionBoxes }: Ground, region: number): Area | null {
	const [left, top, right, bottom] = regionBoxes.subarray(4 * region, 4 * region + 4);
	return left > right ? null : { left, top, right, bottom };
}

/** A region's outline as SVG path data; '' where nothing of it is drawn. */
export function regionPath(ground: Ground, region: number): string {
	const rings: Int32Array[] = [];
	for (let ring = ground.regionRings[region]; ring < ground.regionRings[region + 1]; ring++)
		rings.push(ground.ringArcs.subarray(ground.ringStarts[ring], ground.ringStarts[ring + 1]));
	return ringsPath(ground, rings);
}
