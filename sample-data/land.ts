import type { Cells, Point } from './cells.ts';
import { noise } from './random.ts';

interface Blob {
	at: Point;
	reach: Point;
}

/** Where land stands, km from the middle of the republic: the mainland in four pieces, then islands. */
const blobs: Blob[] = [
	{ at: [-40, 8], reach: [190, 118] },
	{ at: [98, 98], reach: [118, 74] },
	{ at: [-160, -82], reach: [92, 76] },
	{ at: [66, -62], reach: [92, 104] },
	{ at: [258, -48], reach: [33, 70] },
	{ at: [256, 62], reach: [15, 13] },
	{ at: [-276, 92], reach: [22, 15] },
	{ at: [-258, 130], reach: [13, 20] },
	{ at: [-298, 128], reach: [10, 10] },
	{ at: [8, -208], reach: [28, 12] },
	{ at: [-60, -198], reach: [14, 10] },
	{ at: [222, -148], reach: [14, 11] },
	{ at: [-66, 172], reach: [19, 11] },
];

/** Where the sea reaches in. */
const bays: Blob[] = [
	{ at: [-44, -140], reach: [50, 74] },
	{ at: [-14, 152], reach: [50, 60] },
	{ at: [172, 16], reach: [62, 26] },
	{ at: [-212, 8], reach: [44, 18] },
];

const lake: Blob = { at: [-66, 30], reach: [36, 15] };

/** What each cell is: land or water; the lake counts as water. */
export function landCells(cells: Cells, seed: number): boolean[] {
	const dry = cells.centres.map((centre) => height(centre, seed) > 0 && !inLake(centre, seed));
	for (const piece of pieces(cells, dry))
		if (piece.length < 4) for (const c of piece) dry[c] = false;
	const wet = dry.map((land) => !land);
	for (const pond of pieces(cells, wet)) {
		const isLake = pond.some((cell) => inLake(cells.centres[cell], seed));
		if (pond.length < 60 && !isLake) for (const cell of pond) dry[cell] = true;
	}
	return dry;
}

function height([x, y]: Point, seed: number): number {
	const land = Math.max(...blobs.map((blob) => nearness(blob, x, y)));
	const sea = Math.max(...bays.map((bay) => nearness(bay, x, y)));
	return Math.min(land, 0.6) - Math.max(0, sea) * 0.9 + 0.8 * noise(x, y, 96, seed, 1.5);
}

function inLake([x, y]: Point, seed: number): boolean {
	return nearness(lake, x, y) + 0.8 * noise(x, y, 34, seed + 77, 1.5) > 0;
}

/** 1 at the middle of a blob, 0 at its edge, negative outside. */
function nearness({ at, reach }: Blob, x: number, y: number): number {
	return 1 - Math.hypot((x - at[0]) / reach[0], (y - at[1]) / reach[1]);
}

/** Cells that hang together, by neighbour. */
export function pieces(cells: Cells, chosen: readonly boolean[]): number[][] {
	const seen = new Uint8Array(chosen.length);
	const found: number[][] = [];
	chosen.forEach((wanted, first) => {
		if (!wanted || seen[first]) return;
		const piece = [first];
		seen[first] = 1;
		for (const cell of piece) {
			for (const next of cells.neighbours[cell]) {
				if (!chosen[next] || seen[next]) continue;
				seen[next] = 1;
				piece.push(next);
			}
		}
		found.push(piece);
	});
	return found;
}
