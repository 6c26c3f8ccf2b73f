/** What speaks against a place and a scale of an inset, in radians off the true direction. */
import type { Box } from '../plane/fit.ts';

/** A scale half as large is worth this many radians of direction; the scale of the map as many. */
const perOctave = 1.3;
/** A scale so many times smaller than the map's shows next to nothing, and each half costs as much again. */
const tooSmall = 4;
const sameScale = 0.6;
/** Standing in line with another inset saves so much. */
export const inLine = 0.15;
/** No inset can save more than this. */
export const bestOfAll = sameScale + inLine;
/** Standing away from the edges by the whole box costs so much. */
const offEdge = 2;
/** Lying on the wrong side of another inset costs up to so much. */
const swapped = 0.5;

/** An inset that has its place. */
export interface Standing {
	outer: Box;
	towards: [number, number];
}

/** How ill a place suits: radians off the true direction, and the way to the nearest edges. */
export function placeCost(box: Box, [tx, ty]: [number, number], map: Box): number {
	const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
	const [dx, dy] = [x - map.x - map.width / 2, y - map.y - map.height / 2];
	const away = Math.hypot(dx, dy) || 1;
	const known = tx !== 0 || ty !== 0;
	const off = known ? Math.acos(Math.min(1, Math.max(-1, (dx * tx + dy * ty) / away))) : 0;
	const fromSide = Math.min(box.x - map.x, map.x + map.width - box.x - box.width) / map.width;
	const fromEnd = Math.min(box.y - map.y, map.y + map.height - box.y - box.height) / map.height;
	return off + offEdge * (fromSide + fromEnd);
}

/** What it costs that boxes lie the other way round than their regions: north of what is north of them. */
export function swaps(
	{ x, y, width, height }: Box,
	[tx, ty]: [number, number],
	others: Standing[],
): number {
	return others.reduce((sum, { outer, towards: [ox, oy] }) => {
		const [ax, ay] = [tx - ox, ty - oy];
		const [dx, dy] = [
			x + width / 2 - outer.x - outer.width / 2,
			y + height / 2 - outer.y - outer.height / 2,
		];
		const both = Math.hypot(ax, ay) * Math.hypot(dx, dy);
		return both ? sum + swapped * Math.max(0, -(ax * dx + ay * dy) / both) : sum;
	}, 0);
}

/** Left and upper edges that bring a frame into line with the sides of insets that have their place. */
export function inLineWith({ width, height }: Box, others: Standing[]): [number[], number[]] {
	return [
		others.flatMap(({ outer }) => [outer.x, outer.x + outer.width - width]),
		others.flatMap(({ outer }) => [outer.y, outer.y + outer.height - height]),
	];
}

/** Whether a box shares the line of a side with another inset. */
export const isInLine = ({ x, y, width, height }: Box, others: Standing[]): boolean =>
	others.some(
		({ outer }) =>
			x === outer.x ||
			y === outer.y ||
			x + width === outer.x + outer.width ||
			y + height === outer.y + outer.height,
	);

export const isSame = (ratio: number, mapRatio: number): boolean =>
	Math.abs(ratio / mapRatio - 1) < 1e-9;

/** What a scale costs beside the largest that is tried: smallness, less what the scale of the map is worth. */
export function scaleCost(ratio: number, largest: number, mapRatio: number): number {
	const small = Math.max(tooSmall * mapRatio, largest);
	const octaves = Math.log2(ratio / largest) + Math.max(0, Math.log2(ratio / small));
	return perOctave * octaves - (isSame(ratio, mapRatio) ? sameScale : 0);
}
