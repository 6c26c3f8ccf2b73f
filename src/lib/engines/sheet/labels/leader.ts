import { boxAround, cellsAlong, isFree, isBorder, type Ground } from './ground.ts';
import type { Pole } from './pole.ts';
import { paper } from './region-raster.ts';
import type { TextBox } from './text-box.ts';

/** A thin line from inside a region to its name. */
export interface Leader {
	from: { x: number; y: number };
	to: { x: number; y: number };
}

/** Directions tried, and distances in parts of the type size, nearest first. */
const directions = 24;
const distances = [2, 3, 4, 5, 6, 8, 10];
/** Clear space round a name and between a name and its leader, in parts of the type size. */
const clear = 0.3;
/** Names this near to lining up with an earlier one, in parts of the type size, are lined up. */
const nearRail = 3;

/** Whether a line leaves its region once and then runs over empty paper only. */
function isClear(ground: Ground, region: number, line: Leader): boolean {
	const { raster, busy } = ground;
	let left = false;
	for (const cell of cellsAlong(raster, line)) {
		if (cell < 0) return false;
		const owner = raster.owner[cell];
		if (owner === paper) left = true;
		if (busy[cell]) return false;
		if (owner !== paper && !isBorder(owner) && (owner !== region || left)) return false;
	}
	return left;
}

/** Centre of a box whose near edge is at the end of a leader: beside it, or above or below it. */
function boxBeyond({ from, to }: Leader, box: TextBox): { x: number; y: number } {
	const [dx, dy] = [to.x - from.x, to.y - from.y];
	const gap = box.size * clear;
	if (isLevel(dx, dy)) return { x: to.x + Math.sign(dx) * (gap + box.width / 2), y: to.y };
	return { x: to.x, y: to.y + Math.sign(dy) * (gap + box.height / 2) };
}

const isLevel = (dx: number, dy: number) => Math.abs(dx) >= 0.7 * Math.abs(dy);

/** Ends of earlier leaders that go right and left: names at them line up in the sea margin. */
export interface Rails {
	right: number[];
	left: number[];
}

/** The same end moved onto the nearest rail, if there is one close by. */
function onRail(
	to: Leader['to'],
	toRight: boolean,
	box: TextBox,
	rails: Rails,
): Leader['to'] | null {
	let best: number | null = null;
	for (const x of toRight ? rails.right : rails.left) {
		if (best === null || Math.abs(x - to.x) < Math.abs(best - to.x)) best = x;
	}
	if (best === null || Math.abs(best - to.x) > nearRail * box.size) return null;
	return { x: best, y: to.y };
}

/**
 * A place on empty paper for a name, with a leader that crosses no other region, no other name and no
 * other leader; the shortest first, to the right before the left, lined up with names set before where
 * that is near. Null where there is none.
 */
export function spotByLeader(
	ground: Ground,
	region: number,
	pole: Pole,
	box: TextBox,
	rails: Rails,
): { x: number; y: number; leader: Leader } | null {
	const from = { x: Math.round(pole.x), y: Math.round(pole.y) };
	const pad = box.size * clear * 0.9;
	const tried = (to: Leader['to']) => {
		const leader = { from, to };
		const spot = boxBeyond(leader, box);
		const around = boxAround(spot.x, spot.y, box.width + 2 * pad, box.height + 2 * pad);
		return isFree(ground, around, paper) && isClear(ground, region, leader)
			? { ...spot, leader }
			: null;
	};
	for (const distance of distances) {
		const reach = pole.radius + distance * box.size;
		for (let i = 0; i < directions; i++) {
			// 0, 1, -1, 2, -2, ... steps from due right
			const turn = (i % 2 ? (i + 1) / 2 : -i / 2) * ((2 * Math.PI) / directions);
			const [dx, dy] = [Math.cos(turn) * reach, Math.sin(turn) * reach];
			const to = { x: Math.round(from.x + dx), y: Math.round(from.y + dy) };
			const lined = isLevel(dx, dy) ? onRail(to, dx > 0, box, rails) : null;
			const spot = (lined && tried(lined)) ?? tried(to);
			if (!spot) continue;
			if (isLevel(dx, dy)) (dx > 0 ? rails.right : rails.left).push(spot.leader.to.x);
			return spot;
		}
	}
	return null;
}
