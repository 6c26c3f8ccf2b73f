/**
 * Where the boxes of the insets stand and at which scale. Each is tried at the scale of the map and at
 * round ratios, at every free place of the map's box; taken is the place that lies nearest to the true
 * direction, at an edge, at the largest scale. What is set by hand is kept if it is free.
 */
import type { Box } from '../plane/fit.ts';
import { isFree, type FreeGrid } from './free-grid.ts';
import { insetFrame, type InsetDress, type InsetFrame } from './inset-size.ts';
import {
	inLine,
	inLineWith,
	isInLine,
	isSame,
	placeCost,
	scaleCost,
	swaps,
	type Standing,
} from './place-cost.ts';

export interface InsetWish {
	name: string;
	/** size of the regions at 1 : 1, hundredths of a millimetre */
	width: number;
	height: number;
	/** unit vector on the paper from the middle of the map; [0, 0] where there is no telling */
	towards: [number, number];
	ratio: number | null;
	cornerMm: [number, number] | null;
}

export interface InsetSpot {
	outer: Box;
	inner: Box;
	head: InsetFrame['head'];
	bar: boolean;
	ratio: number;
	/** how ill it suits: radians off the true direction, and what smallness and distance from the edge cost */
	cost: number;
	/** what was set by hand and could not be kept */
	told: string[];
}

/**
 * Regions in an inset may be as long as these shares of the map's box, and are at least so long on A4; if
 * they are drawn larger than on the map, at most so long.
 */
const sides = { ofShorter: 0.5, ofBox: 0.3, least: 700, enlarged: 1700 };
const steps = [1, 1.25, 1.5, 2, 2.5, 3, 4, 5, 6, 8];
/** Clear of regions and other boxes, on A4. */
const clearance = 120;

interface Ground {
	grid: FreeGrid;
	dress: InsetDress;
	/** 1 : n of the map itself */
	mapRatio: number;
	scale: number;
	obstacles: readonly Box[];
}

/** Round ratios at which the regions are neither too large nor too small, the largest scale first. */
function ratiosFor(wish: InsetWish, { grid, mapRatio, scale }: Ground): number[] {
	if (wish.ratio !== null) return [wish.ratio];
	const { width, height } = grid.box;
	const shorter = sides.ofShorter * Math.min(width, height);
	const across = Math.max(shorter, sides.ofBox * width);
	const down = Math.max(shorter, sides.ofBox * height);
	const longer = Math.max(wish.width, wish.height);
	const least = Math.min(sides.least * scale, shorter / 3);
	const fits = (ratio: number) => {
		const within = wish.width / ratio <= across && wish.height / ratio <= down;
		const most = ratio < mapRatio * 0.999 ? sides.enlarged * scale : Infinity;
		return within && longer / ratio >= least && longer / ratio <= most;
	};
	const power = 10 ** Math.floor(Math.log10(longer / Math.max(across, down)) - 1);
	const tens = [power, 10 * power, 100 * power, 1000 * power];
	const round = tens.flatMap((ten) => steps.map((step) => step * ten)).filter(fits);
	const all = fits(mapRatio) ? [mapRatio, ...round] : round;
	// what is as long as the paper at every scale is as large as fits
	return all.length
		? all.sort((a, b) => a - b)
		: [Math.max(wish.width / across, wish.height / down)];
}

const overlap = (a: Box, b: Box, apart: number): boolean =>
	a.x < b.x + b.width + apart &&
	b.x < a.x + a.width + apart &&
	a.y < b.y + b.height + apart &&
	b.y < a.y + a.height + apart;

function isClear(box: Box, { grid, scale, obstacles }: Ground, others: Standing[]): boolean {
	const apart = clearance * scale;
	if (others.some(({ outer }) => overlap(box, outer, apart))) return false;
	if (obstacles.some((other) => overlap(box, other, apart))) return false;
	// against the edges of the map's box nothing need be kept clear
	const [left, top] = [Math.max(grid.box.x, box.x - apart), Math.max(grid.box.y, box.y - apart)];
	const right = Math.min(grid.box.x + grid.box.width, box.x + box.width + apart);
	const bottom = Math.min(grid.box.y + grid.box.height, box.y + box.height + apart);
	if (box.x < left || box.y < top || box.x + box.width > right || box.y + box.height > bottom)
		return false;
	return isFree(grid, { x: left, y: top, width: right - left, height: bottom - top });
}

const movedTo = (box: Box, x: number, y: number): Box => ({ ...box, x: box.x + x, y: box.y + y });

/** The best free place for a frame of a size that costs less than `below`; null where there is none. */
function bestPlace(frame: Box, wish: InsetWish, ground: Ground, others: Standing[], below: number) {
	const { grid } = ground;
	const [wide, high] = [grid.box.width - frame.width, grid.box.height - frame.height];
	if (wide < 0 || high < 0) return null;
	const places = (room: number, inLine: number[]) => {
		const count = Math.max(1, Math.floor(room / (1.5 * grid.cell)));
		const even = Array.from({ length: count + 1 }, (_, i) => Math.round((room * i) / count));
		return [...even, ...inLine.filter((at) => at >= 0 && at <= room)];
	};
	const [across, down] = inLineWith(frame, others);
	const [xs, ys] = [
		places(
			wide,
			across.map((x) => x - grid.box.x),
		),
		places(
			high,
			down.map((y) => y - grid.box.y),
		),
	];
	let best: { box: Box; cost: number } | null = null;
	for (const y of ys) {
		for (const x of xs) {
			const box = movedTo(frame, grid.box.x + x, grid.box.y + y);
			const most = best?.cost ?? below;
			const alone = placeCost(box, wish.towards, grid.box);
			if (alone - inLine >= most) continue;
			const own = isInLine(box, others) ? alone - inLine : alone;
			const costs = own + swaps(box, wish.towards, others);
			if (costs < most && isClear(box, ground, others)) best = { box, cost: costs };
		}
	}
	return best;
}

function spotFor(
	wish: InsetWish,
	ground: Ground,
	others: Standing[],
): Omit<InsetSpot, 'told'> | null {
	let best: Omit<InsetSpot, 'told'> | null = null;
	const ratios = ratiosFor(wish, ground);
	for (const ratio of ratios) {
		const [width, height] = [wish.width / ratio, wish.height / ratio];
		const sameScale = isSame(ratio, ground.mapRatio);
		const frame = insetFrame(ground.dress, wish.name, { ratio, sameScale }, width, height);
		const { outer, inner, head, bar } = frame;
		const own = scaleCost(ratio, ratios[0], ground.mapRatio);
		const most: number = (best?.cost ?? Infinity) - own;
		const found = wish.cornerMm
			? byHand(outer, wish.cornerMm, ground, others)
			: bestPlace(outer, wish, ground, others, most);
		if (!found || found.cost >= most) continue;
		const { box } = found;
		const place = { outer: box, inner: movedTo(inner, box.x, box.y) };
		best = { ...place, head, bar, ratio, cost: found.cost + own };
	}
	return best;
}

function byHand(frame: Box, [x, y]: [number, number], ground: Ground, others: Standing[]) {
	const box = movedTo(frame, Math.round(100 * x), Math.round(100 * y));
	return isClear(box, ground, others) ? { box, cost: 0 } : null;
}

/** What a wish falls back on, with what has to be told then. */
function eased(wish: InsetWish): { wish: InsetWish; told: string[] }[] {
	const name = `The box of ${wish.name}`;
	const tries = [{ wish, told: [] as string[] }];
	if (wish.cornerMm)
		tries.push({
			wish: { ...wish, cornerMm: null },
			told: [
				`${name} would lie over the map, another box or the edge where you put it, so it stands where there is room.`,
			],
		});
	if (wish.ratio !== null)
		tries.push({
			wish: { ...wish, cornerMm: null, ratio: null },
			told: [`${name} finds no room at the scale you set, so it is drawn at one that fits.`],
		});
	return tries;
}

/** A spot for every wish, in their order; null for those that find no room. Boxes set by hand come first. */
export function placeInsets(wishes: InsetWish[], ground: Ground): (InsetSpot | null)[] {
	const spots: (InsetSpot | null)[] = wishes.map(() => null);
	const order = wishes
		.map((_, i) => i)
		.sort((a, b) => Number(!!wishes[b].cornerMm) - Number(!!wishes[a].cornerMm) || a - b);
	for (const i of order) {
		const others = spots.flatMap((spot, other) =>
			spot ? [{ outer: spot.outer, towards: wishes[other].towards }] : [],
		);
		for (const { wish, told } of eased(wishes[i])) {
			const spot = spotFor(wish, ground, others);
			if (!spot) continue;
			spots[i] = { ...spot, told };
			break;
		}
	}
	return spots;
}
