import { area, featureCollection, intersect } from '@turf/turf';
import type { Coverage } from '../coverage.ts';
import { CheckShapes, type Box } from './check-shapes.ts';
import type { RegionMatch } from './region-match.ts';

/** Shares told on a sphere, and by edges straight in longitude and latitude, may be so far off. */
const tolerance = 0.01;

/** Turf takes seconds for outlines with more points than this. */
const mostPoints = 20_000;

/** Points of all pairs together that are looked at; of more, every second pair, every third ... */
const pointsInAll = 150_000;

/** The whole turns, in degrees, by which two coverages may be unwrapped otherwise. */
const turns = [-720, -360, 0, 360, 720];

/**
 * Sampled pairs whose share of area is another than the match says, by Turf. Left out: outlines of more
 * than 20,000 points, and whatever else lies on a region that is drawn as one before it was. So that the
 * check takes seconds, pairs are passed over evenly where they have more than 150,000 points in all.
 */
export function* areaFaults(
	before: Coverage,
	after: Coverage,
	match: RegionMatch,
	sample: number,
): Generator<string> {
	const [olds, news] = [new CheckShapes(before), new CheckShapes(after)];
	const listed = new Map<string, number>();
	const { from: froms, to: tos, shareOfOld, shareOfNew } = match.links;
	const isSettled = { old: new Set<number>(), new: new Set<number>() };
	froms.forEach((from, i) => {
		listed.set(`${from} ${tos[i]}`, i);
		if (shareOfOld[i] < 1 || shareOfNew[i] < 1) return;
		isSettled.old.add(from);
		isSettled.new.add(tos[i]);
	});
	const isLeftOut = ([from, to]: [number, number]) =>
		!listed.has(`${from} ${to}`) && (isSettled.old.has(from) || isSettled.new.has(to));
	const pairs = sampledPairs(olds, news, sample).filter((pair) => !isLeftOut(pair));
	for (const [from, to] of thinned(pairs, olds, news)) {
		const link = listed.get(`${from} ${to}`);
		const common = commonArea(olds, from, news, to);
		const [old, fresh] = link === undefined ? [0, 0] : [shareOfOld[link], shareOfNew[link]];
		const off = [common / area(olds.shape(from)) - old, common / area(news.shape(to)) - fresh];
		if (off.some((share) => Math.abs(share) > tolerance)) {
			yield `"${before.keys[from]}" and "${after.keys[to]}" have other ground in common than it says.`;
		}
	}
}

/** Pairs of which one is sampled and whose boxes meet, each once. */
function sampledPairs(olds: CheckShapes, news: CheckShapes, sample: number): [number, number][] {
	const pairs = new Map<string, [number, number]>();
	for (const from of spread(olds.boxes.length, sample)) {
		for (const to of near(olds.boxes[from], news)) pairs.set(`${from} ${to}`, [from, to]);
	}
	for (const to of spread(news.boxes.length, sample)) {
		for (const from of near(news.boxes[to], olds)) pairs.set(`${from} ${to}`, [from, to]);
	}
	return [...pairs.values()];
}

/** Up to so many numbers below `count`, evenly taken. */
const spread = (count: number, sample: number): number[] =>
	Array.from({ length: Math.min(count, sample) }, (_, i) =>
		Math.floor((i * count) / Math.min(count, sample)),
	);

const near = ([west, south, east, north]: Box, shapes: CheckShapes) =>
	turns.flatMap((turn) => shapes.meeting([west + turn, south, east + turn, north]));

function thinned(pairs: [number, number][], olds: CheckShapes, news: CheckShapes) {
	const pointsOf = ([from, to]: [number, number]) => olds.points[from] + news.points[to];
	const fit = pairs.filter((pair) => pointsOf(pair) <= mostPoints);
	const points = fit.reduce((sum, pair) => sum + pointsOf(pair), 0);
	const step = Math.max(1, Math.ceil(points / pointsInAll));
	return fit.filter((_, i) => i % step === 0);
}

/** Square metres that two regions have in common, whatever the turns between them. */
function commonArea(olds: CheckShapes, from: number, news: CheckShapes, to: number): number {
	const [west, , east] = olds.boxes[from];
	const [otherWest, , otherEast] = news.boxes[to];
	let common = 0;
	for (const turn of turns) {
		if (otherWest + turn > east || otherEast + turn < west) continue;
		const cut = intersect(featureCollection([olds.shape(from), news.shape(to, turn)]));
		if (cut) common += area(cut);
	}
	return common;
}
