import type { Pole } from './pole.ts';
import { allOwnedBy, cellAt, outline, paper, type RegionRaster } from './region-raster.ts';
import type { TextBox } from './text-box.ts';

/** A thin line from inside a region to its name. */
export interface Leader {
	from: { x: number; y: number };
	to: { x: number; y: number };
}

/** Directions tried, and distances in parts of the type size, nearest first. */
const directions = 24;
const distances = [2, 3, 4, 5, 6, 8];
/** Clear space round a name and between a name and its leader, in parts of the type size. */
const clear = 0.3;

/** Whether a line leaves its region once and then runs over empty paper only. */
function isClear(raster: RegionRaster, region: number, { from, to }: Leader): boolean {
	const steps = Math.ceil((2 * Math.hypot(to.x - from.x, to.y - from.y)) / raster.cell);
	let left = false;
	for (let step = 0; step <= steps; step++) {
		const t = step / steps;
		const cell = cellAt(raster, from.x + (to.x - from.x) * t, from.y + (to.y - from.y) * t);
		if (cell < 0) return false;
		const owner = raster.owner[cell];
		if (owner === paper) left = true;
		else if (owner !== outline && (owner !== region || left)) return false;
	}
	return left;
}

/** Centre of a box whose near edge is at the end of a leader: beside it, or above or below it. */
function boxBeyond({ from, to }: Leader, box: TextBox): { x: number; y: number } {
	const [dx, dy] = [to.x - from.x, to.y - from.y];
	const gap = box.size * clear;
	if (Math.abs(dx) >= 0.7 * Math.abs(dy)) {
		return { x: to.x + Math.sign(dx) * (gap + box.width / 2), y: to.y };
	}
	return { x: to.x, y: to.y + Math.sign(dy) * (gap + box.height / 2) };
}

/**
 * A place on empty paper for a name, with a leader that crosses no other region, no other name and no
 * other leader; the shortest first, to the right before the left. Null where there is none.
 */
export function spotByLeader(raster: RegionRaster, region: number, pole: Pole, box: TextBox) {
	for (const distance of distances) {
		for (let i = 0; i < directions; i++) {
			// 0, 1, -1, 2, -2, ... steps from due right
			const turn = (i % 2 ? (i + 1) / 2 : -i / 2) * ((2 * Math.PI) / directions);
			const reach = pole.radius + distance * box.size;
			const from = { x: Math.round(pole.x), y: Math.round(pole.y) };
			const to = {
				x: Math.round(pole.x + Math.cos(turn) * reach),
				y: Math.round(pole.y + Math.sin(turn) * reach),
			};
			const spot = boxBeyond({ from, to }, box);
			const pad = box.size * clear * 0.9;
			const around = {
				x: spot.x - box.width / 2 - pad,
				y: spot.y - box.height / 2 - pad,
				width: box.width + 2 * pad,
				height: box.height + 2 * pad,
			};
			if (allOwnedBy(raster, around, paper) && isClear(raster, region, { from, to })) {
				return { ...spot, leader: { from, to } };
			}
		}
	}
	return null;
}
