/**
 * Lettering of the map: which level is named, at which size, and where each name stands. One size for
 * a level, because a size that follows the room would look like rank. A level is lettered where at
 * least 60 % of it fits; else the level above is, and the regions are listed beside the map.
 */
import type { DrawnText } from '../drawing.ts';
import { leastLegiblePt, type Lettering } from '../layout/lettering.ts';
import type { Box } from '../plane/fit.ts';
import { occupy } from './ground.ts';
import { labelGroups, type GroupInput, type GroupNames } from './group-labels.ts';
import type { Leader } from './leader.ts';
import { letteringNotes } from './lettering-notes.ts';
import { nameTask } from './name-task.ts';
import { setNumbers } from './numbers.ts';
import { handNames, labelRegions, type NameTask } from './region-labels.ts';
import {
	isOnSheet,
	noAnchor,
	type DrawnLettering,
	type HowNamed,
	type SetName,
} from './set-name.ts';
import { boxOfText } from './text-box.ts';
import { textsOf } from './texts-of-names.ts';

/** Hundredths of a millimetre to a point (1/72 inch). */
export const point = 2540 / 72;
/** Type sizes on A4, in points; grown with the paper, but never below what can be read. */
const sizes = [9, 8, 7, 6, 5];
/** Tried on large paper as well, before the names are given up. */
const small = [6, 5.5, 5];
/** For the level above. */
const groupSizes = [10, 9, 8, 7];
/** Beside names of regions, in spaced capitals. */
const spacedSizes = [10, 9, 8, 7];
/** Above so many names only the smallest sizes are tried, which bounds the time. */
const mostAtEverySize = 8_000;
/**
 * Type larger by a point is worth this share of the names, and below the second figure three times as much: small
 * type on a roomy map reads ill. Common practice, no source.
 */
const perPoint = 0.015;
const smallBelow = 6;
/** A name that stands off its region, or over a border, counts less: better smaller and in its place. */
const countsFor: Partial<Record<HowNamed, number>> = { beside: 0.9, leader: 0.7, over: 0.7 };
/** What a larger size may by chance fit more than the smallest. */
const chance = 0.03;
const enough = 0.6;
/** Names of the level above stand between those of regions where this share of these has room enough. */
const suits = 0.85;
/** Without a level above, a map with some names says more than a map with none. */
const enoughAlone = 0.2;

export interface LabelInput extends GroupInput {
	keys: string[];
	/** cleaned, in region order */
	names: string[];
	areas: Float64Array;
	scale: number;
	lettering: Lettering;
	/** what stands on the map already: insets' frames, text blocks, a legend laid over it */
	obstacles: readonly Box[];
	/** insets' frames, each as a whole */
	frames: readonly Box[];
	/** the whole paper without its edge, which names set by hand do not leave */
	paper: Box;
}

export interface Labelled {
	texts: DrawnText[];
	leaders: Leader[];
	unplaced: number[];
	lettering: DrawnLettering;
}

/** What a sheet without names tells of its lettering. */
export function unlettered(regions: number): Labelled {
	const how = Array.from({ length: regions }, (): HowNamed => 'off');
	const none = { numbers: new Uint32Array(regions), short: new Uint8Array(regions) };
	const anchors = new Int32Array(2 * regions).fill(noAnchor);
	const points = { regions: null, groups: null };
	return {
		...{ texts: [], leaders: [], unplaced: how.map((_, region) => region) },
		lettering: { how, ...none, anchors, points, notes: [] },
	};
}

const units = (points: number) => Math.round(points * point);

/** Sizes to be tried, the largest first. */
function sizesFor(input: LabelInput): number[] {
	const { scale, lettering } = input;
	if (lettering.sizePt !== null) return [units(lettering.sizePt)];
	const all = [...sizes.map((one) => one * scale), ...small].filter((one) => one >= leastLegiblePt);
	const tried = [...new Set(all.map(units))].sort((a, b) => b - a);
	return input.names.length > mostAtEverySize ? tried.slice(-2) : tried;
}

export function labelSheet(input: LabelInput): Labelled {
	const { groups, names, lettering } = input;
	const grouped = new Set(groups.filter((group) => group !== null)).size > 1;
	const asked = grouped ? enough : enoughAlone;
	const tried = sizesFor(input);
	const { task, hopeful } = nameTask(input, tried[tried.length - 1]);
	const size = sizeThatDoes(task, tried, hopeful / Math.max(1, names.length), asked);
	const least = tried[tried.length - 1];
	const set = size ? labelRegions(task, size) : handNames(task, least);
	const roomy = set.filter(({ how }) => how !== 'over').length >= suits * names.length;
	const above = grouped && (!size || roomy) ? namesAbove(input, task, Boolean(size)) : null;
	const { numbered, list } = lettering.numbers
		? numbersFor(input, task, set, size ?? least, !size)
		: { numbered: [], list: [] };
	return together(input, task, [...set, ...numbered], {
		size: size ?? (set.length ? least : null),
		above,
		list,
		isFew: !size,
	});
}

/** The size that suits best, more names against larger type; null where too few fit at the smallest. */
function sizeThatDoes(
	task: NameTask,
	tried: number[],
	possible: number,
	asked: number,
): number | null {
	// a sheet of specks: not even looked at, for too few of its names could stand
	if (possible < asked) return null;
	const share = (names: SetName[]) =>
		names.reduce((sum, { how }) => sum + (countsFor[how] ?? 1), 0) / Math.max(1, task.ways.length);
	const least = tried[tried.length - 1];
	const most = share(labelRegions(task, least));
	if (most < asked) return null;
	const larger = (size: number) => worthOfSize(size / point) - worthOfSize(least / point);
	let best = { size: least, worth: most };
	for (const size of tried.slice(0, -1)) {
		// neither this nor any smaller could do better
		if (most + chance + larger(size) <= best.worth) break;
		const fits = share(labelRegions(task, size));
		const worth = fits + larger(size);
		if (fits >= asked && worth >= best.worth) best = { size, worth };
	}
	return best.size;
}

const worthOfSize = (points: number): number =>
	perPoint * (points + 2 * Math.min(points, smallBelow));

/** The level above: instead of regions in bold, or between their names in spaced capitals. */
function namesAbove(input: LabelInput, task: NameTask, isBeside: boolean): GroupNames | null {
	const { lettering, scale } = input;
	if (!lettering.groupNames) return null;
	const own = lettering.groupSizePt;
	const usual = (isBeside ? spacedSizes : groupSizes).map((one) => one * scale);
	const tried = (own === null ? usual : [own]).map(units);
	const found = labelGroups(input, tried, task.ground.busy, isBeside);
	if (isBeside && found.share < enough) return null;
	for (const text of found.texts) occupy(task.ground, boxOfText(text));
	return found;
}

function numbersFor(
	{ names, scale, lettering, keys }: LabelInput,
	task: NameTask,
	set: SetName[],
	size: number,
	allOrNone: boolean,
) {
	const done = new Set(set.map(({ region }) => region));
	const hidden = new Set(lettering.hidden);
	const waiting = task.order.filter((region) => !done.has(region) && !hidden.has(keys[region]));
	return setNumbers(task, waiting, names, size, scale, allOrNone);
}

interface Found {
	size: number | null;
	above: GroupNames | null;
	list: DrawnText[];
	/** whether too few names of regions fit */
	isFew: boolean;
}

function together(input: LabelInput, task: NameTask, names: SetName[], found: Found): Labelled {
	const { size, above, list, isFew } = found;
	const hidden = new Set(input.lettering.hidden);
	const how = input.names.map((name, region): HowNamed => {
		if (hidden.has(input.keys[region])) return 'hidden';
		if (!name) return 'nameless';
		return task.ways[region].lacking ? 'letters' : 'listed';
	});
	const short = new Uint8Array(how.length);
	const numbers = new Uint32Array(how.length);
	for (const name of names) {
		how[name.region] = name.how;
		if (name.short) short[name.region] = 1;
		if (name.how === 'number') numbers[name.region] = Number(name.box.lines[0].text);
	}
	const points = {
		regions: size && Math.round((size / point) * 10) / 10,
		groups: above?.texts.length ? Math.round((above.size / point) * 10) / 10 : null,
	};
	const anchors = Int32Array.from(
		task.anchors.flatMap((at) =>
			at ? [Math.round(at.x), Math.round(at.y)] : [noAnchor, noAnchor],
		),
	);
	const lettering = { how, short, numbers, anchors, points };
	return {
		texts: [...(above?.texts ?? []), ...textsOf(names), ...list],
		leaders: names.flatMap(({ leader }) => leader ?? []),
		unplaced: how.flatMap((one, region) => (isOnSheet(one) || one === 'hidden' ? [] : region)),
		lettering: { ...lettering, notes: letteringNotes(input, task, names, { ...lettering, isFew }) },
	};
}
