import type { PlacedName } from '../layout/lettering.ts';
import type { Box } from '../plane/fit.ts';
import { spotBeside } from './beside.ts';
import { boxAround, occupy, occupyLine, type Ground } from './ground.ts';
import { setByHand } from './hand.ts';
import { headroom } from './headroom.ts';
import { spotInside, type Spot } from './inside.ts';
import { spotByLeader, type Rails } from './leader.ts';
import type { NameWays } from './name-ways.ts';
import { spotOver } from './over.ts';
import type { Pole } from './pole.ts';
import type { SetName } from './set-name.ts';
import { textBox, type TextBox } from './text-box.ts';

/** All that placing region names asks for; the same for every size that is tried. */
export interface NameTask {
	ground: Ground;
	/** what is taken before any name is set */
	fixed: Uint8Array;
	paperBox: Box;
	/** null where no name could stand by itself */
	poles: (Pole | null)[];
	/** where names set by hand are measured from; null for a region that is not drawn */
	anchors: ({ x: number; y: number } | null)[];
	ways: NameWays[];
	/** 1 for regions that border on nothing somewhere: only their names can stand outside */
	coastal: Uint8Array;
	/** regions whose names are set by themselves, the most important first */
	order: number[];
	hand: Map<number, PlacedName>;
}

export const labelFace = 'serif';

/** Distance of a name from the borders left and right of it, in parts of its size; half above and below. */
const inset = 0.2;

export const boxesOf = (ways: string[][], size: number): TextBox[] =>
	ways.map((lines) => textBox(lines, labelFace, size));

/** The name in one, two or three lines inside its region, whichever keeps nearest to the pole. */
function bestInside({ raster, room }: Ground, region: number, pole: Pole, boxes: TextBox[]) {
	let best: { box: TextBox; spot: Spot } | null = null;
	for (const box of boxes) {
		const air = box.size * inset;
		const spot = spotInside(raster, room, region, pole, box.width + 2 * air, box.height + air);
		// a second line is worth its while only if it brings the name well nearer to the middle
		if (spot && (!best || spot.away < best.spot.away - box.size)) best = { box, spot };
	}
	return best;
}

type Try = (
	region: number,
	pole: Pole,
	boxes: TextBox[],
) => Omit<SetName, 'region' | 'short'> | null;

const inside =
	(ground: Ground): Try =>
	(region, pole, boxes) => {
		const found = bestInside(ground, region, pole, boxes);
		if (!found) return null;
		const { box, spot } = found;
		return { how: 'inside', box, x: spot.x, y: spot.y, ground: 'fill', leader: null };
	};

const beside =
	({ ground, coastal }: NameTask): Try =>
	(region, pole, boxes) => {
		if (!coastal[region]) return null;
		for (const box of boxes) {
			const spot = spotBeside(ground, region, pole, box);
			if (spot) return { how: 'beside', box, ...spot, ground: 'paper', leader: null };
		}
		return null;
	};

const over =
	(ground: Ground): Try =>
	(region, pole, boxes) => {
		let best: ReturnType<Try> = null;
		let most = 0;
		for (const box of boxes) {
			const spot = spotOver(ground, region, pole, box);
			if (!spot || spot.own <= most) continue;
			most = spot.own;
			best = { how: 'over', box, x: spot.x, y: spot.y, ground: 'edge', leader: null };
		}
		return best;
	};

const byLeader =
	({ ground, coastal }: NameTask, rails: Rails): Try =>
	(region, pole, boxes) => {
		if (!coastal[region] || !boxes.length) return null;
		const spot = spotByLeader(ground, region, pole, boxes[0], rails);
		return spot && { how: 'leader', box: boxes[0], ...spot, ground: 'paper' };
	};

/** Takes up what a name stands on, and its leader. */
export function keep(ground: Ground, { box, x, y, leader }: SetName): void {
	occupy(ground, boxAround(x, y, box.width, box.height));
	if (leader) occupyLine(ground, leader);
}

/** Names set by hand stand first; only what stood before names is under them. */
export function handNames(task: NameTask, size: number): SetName[] {
	const { ground, hand, anchors, ways, paperBox } = task;
	ground.busy.set(task.fixed);
	const names: SetName[] = [];
	for (const [region, place] of hand) {
		const lines = place.short && ways[region].short.length ? ways[region].short : ways[region].full;
		const boxes = boxesOf(lines, size);
		const asked = place.lines && boxes[Math.min(place.lines, boxes.length) - 1];
		const box = asked || narrowest(boxes);
		const anchor = anchors[region];
		if (!box || !anchor) continue;
		names.push(setByHand(ground, region, anchor, place, box, paperBox));
	}
	for (const name of names) keep(ground, name);
	return names;
}

/** One line unless it is long: then the way that is nearest to three times as wide as high. */
function narrowest(boxes: TextBox[]): TextBox | undefined {
	const off = ({ width, height }: TextBox) => Math.abs(Math.log(width / (height * 3)));
	return (
		boxes.find(({ width, size }) => width < 9 * size) ??
		boxes.toSorted((a, b) => off(a) - off(b))[0]
	);
}

/**
 * Region names at one size. Those set by hand where they are; then inside the region, else on empty
 * paper beside it, else abbreviated inside, else a little over its borders, else on empty paper with a
 * leader, else not at all. No two names overlap, but for two set by hand, and no leader crosses another.
 */
export function labelRegions(task: NameTask, size: number): SetName[] {
	const { ground, poles, ways, order } = task;
	const names = handNames(task, size);
	if (names.length) ground.room = headroom(ground.raster, ground.busy);
	const rails: Rails = { right: [], left: [] };
	let waiting = order.filter((region) => poles[region] && !task.hand.has(region));
	const full = ways.map((one) => boxesOf(one.full, size));
	const abbreviated = ways.map((one) => boxesOf(one.short, size));
	const pass = (tried: Try, short: boolean) => {
		waiting = waiting.filter((region) => {
			const boxes = short ? abbreviated[region] : full[region];
			const found = boxes.length ? tried(region, poles[region]!, boxes) : null;
			if (!found) return true;
			const name = { region, short, ...found };
			names.push(name);
			keep(ground, name);
			return false;
		});
	};
	pass(inside(ground), false);
	pass(beside(task), false);
	pass(inside(ground), true);
	pass(over(ground), false);
	pass(over(ground), true);
	pass(beside(task), true);
	pass(byLeader(task, rails), false);
	pass(byLeader(task, rails), true);
	return names;
}

/** A number inside its region, else a little over its borders, else beside it or by a leader. */
export function numberSpot(task: NameTask, region: number, box: TextBox, rails: Rails) {
	const pole = task.poles[region];
	if (!pole) return null;
	for (const tried of [
		inside(task.ground),
		over(task.ground),
		beside(task),
		byLeader(task, rails),
	]) {
		const found = tried(region, pole, [box]);
		if (found) return found;
	}
	return null;
}
