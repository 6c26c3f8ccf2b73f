import { area, bbox, featureCollection, intersect } from '@turf/turf';
import Flatbush from 'flatbush';
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import type { Coverage } from '../coverage.ts';
import { coverageToGeoJson } from '../to-geojson.ts';
import type { RegionMatch } from './region-match.ts';

type Area = Feature<Polygon | MultiPolygon>;

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
	const olds: Area[] = coverageToGeoJson(before).features;
	const news: Area[] = coverageToGeoJson(after).features;
	const listed = new Map<string, number>();
	const { from: froms, to: tos, shareOfOld, shareOfNew } = match.links;
	const isSettled = { old: new Set<number>(), new: new Set<number>() };
	froms.forEach((from, i) => {
		listed.set(`${from} ${tos[i]}`, i);
		if (shareOfOld[i] < 1 || shareOfNew[i] < 1) return;
		isSettled.old.add(from);
		isSettled.new.add(tos[i]);
	});
	for (const [from, to] of sampledPairs(olds, news, sample)) {
		const link = listed.get(`${from} ${to}`);
		if (link === undefined && (isSettled.old.has(from) || isSettled.new.has(to))) continue;
		if (pointsOf(olds[from]) + pointsOf(news[to]) > mostPoints) continue;
		const common = commonArea(olds[from], news[to]);
		const [old, fresh] = link === undefined ? [0, 0] : [shareOfOld[link], shareOfNew[link]];
		const off = [common / area(olds[from]) - old, common / area(news[to]) - fresh];
		if (off.some((share) => Math.abs(share) > tolerance)) {
			yield `"${before.keys[from]}" and "${after.keys[to]}" have other ground in common than it says.`;
		}
	}
}

/** Pairs of which one is sampled and whose boxes meet, each once. */
function sampledPairs(olds: Area[], news: Area[], sample: number): [number, number][] {
	const pairs = new Map<string, [number, number]>();
	if (olds.length === 0 || news.length === 0) return [];
	const [nearOld, nearNew] = [boxSearch(olds), boxSearch(news)];
	for (const from of spread(olds.length, sample)) {
		for (const to of nearNew(olds[from])) pairs.set(`${from} ${to}`, [from, to]);
	}
	for (const to of spread(news.length, sample)) {
		for (const from of nearOld(news[to])) pairs.set(`${from} ${to}`, [from, to]);
	}
	const all = [...pairs.values()];
	const points = all.reduce(
		(sum, [from, to]) => sum + pointsOf(olds[from]) + pointsOf(news[to]),
		0,
	);
	const step = Math.max(1, Math.ceil(points / pointsInAll));
	return all.filter((_, i) => i % step === 0);
}

/** Up to so many numbers below `count`, evenly taken. */
const spread = (count: number, sample: number): number[] =>
	Array.from({ length: Math.min(count, sample) }, (_, i) =>
		Math.floor((i * count) / Math.min(count, sample)),
	);

function boxSearch(areas: Area[]): (area: Area) => number[] {
	const index = new Flatbush(areas.length);
	for (const one of areas) {
		const [west, south, east, north] = bbox(one);
		index.add(west, south, east, north);
	}
	index.finish();
	return (one) => {
		const [west, south, east, north] = bbox(one);
		return turns.flatMap((turn) => index.search(west + turn, south, east + turn, north));
	};
}

/** Square metres that two areas have in common, whatever the turns between them. */
function commonArea(one: Area, other: Area): number {
	const [west, , east] = bbox(one);
	const [otherWest, , otherEast] = bbox(other);
	let common = 0;
	for (const turn of turns) {
		if (otherWest + turn > east || otherEast + turn < west) continue;
		const cut = intersect(featureCollection([one, moved(other, turn)]));
		if (cut) common += area(cut);
	}
	return common;
}

function moved(one: Area, by: number): Area {
	if (by === 0) return one;
	const coordinates = polygonsOf(one).map((rings) =>
		rings.map((ring) => ring.map(([lon, lat]) => [lon + by, lat])),
	);
	return { ...one, geometry: { type: 'MultiPolygon', coordinates } };
}

const polygonsOf = ({ geometry }: Area) =>
	geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates;

const pointsOf = (one: Area) =>
	polygonsOf(one)
		.flat()
		.reduce((sum, ring) => sum + ring.length, 0);
