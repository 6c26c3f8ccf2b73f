/**
 * Parts that lie near one another, taken together: which groups of parts a map falls into. In: a
 * coverage. Out: groups from the largest to the smallest, each part in one. Parts are together where they
 * touch, or where the water between their coasts is narrower than 0.35 times the root of the largest part's
 * area, and at least 100 and at most 300 km (own rule of the house).
 *
 * Gaps are measured between coast points thinned to a tenth of the gap, so they are true to a fifth.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { sweptKm2 } from '../../geometry/index.ts';
import { ringLonLat, runOn, type LonLat } from '../plane/ring-lonlat.ts';

export interface Cluster {
	/** key of the region that its largest part belongs to, and where that part lies to a degree */
	id: string;
	/** longitude and latitude of a place in its largest part, degrees */
	at: [number, number];
	parts: number[];
	areaKm2: number;
	/** area of each region in it, largest first */
	regions: { region: number; areaKm2: number }[];
}

/** Half the surface of the WGS 84 ellipsoid. */
const halfGlobeKm2 = 255_032_811;
const earthKm = 6371.0088;
const gapLimits = { share: 0.35, least: 100, most: 300 };

export function clustersOf(coverage: Coverage): Cluster[] {
	const areas = partAreas(coverage);
	const largest = areas.reduce((most, area) => Math.max(most, area), 0);
	const gap = Math.min(
		gapLimits.most,
		Math.max(gapLimits.least, gapLimits.share * Math.sqrt(largest)),
	);
	const { find, join } = unionFind(areas.length);
	const firstPart = joinTouching(coverage, join);
	joinNear(coastPlaces(coverage, firstPart, gap), gap, find, join);
	const members = new Map<number, number[]>();
	areas.forEach((_, part) => {
		const root = find(part);
		const list = members.get(root);
		if (list) list.push(part);
		else members.set(root, [part]);
	});
	return [...members.values()]
		.map((parts) => clusterOf(coverage, parts, areas))
		.sort((a, b) => b.areaKm2 - a.areaKm2 || (a.id < b.id ? -1 : 1));
}

function unionFind(count: number) {
	const parent = Int32Array.from({ length: count }, (_, i) => i);
	const find = (item: number): number => {
		while (parent[item] !== item) item = parent[item] = parent[parent[item]];
		return item;
	};
	const join = (a: number, b: number) => {
		parent[find(a)] = find(b);
	};
	return { find, join };
}

/** Area of each part, km². */
function partAreas(coverage: Coverage): Float64Array {
	const { ringArcs, ringStarts, partRings } = coverage;
	return Float64Array.from({ length: partRings.length - 1 }, (_, part) => {
		let sum = 0;
		for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
			const points = ringLonLat(
				coverage,
				ringArcs.subarray(ringStarts[ring], ringStarts[ring + 1]),
			);
			const swept = sweptKm2(Float64Array.from(points.flat()), 0, points.length - 1);
			const turns = Math.abs(points[points.length - 1][0] - points[0][0]) > 180;
			// a ring round a pole parts its half of the globe
			sum += turns ? halfGlobeKm2 - Math.abs(swept) : swept;
		}
		return Math.abs(sum);
	});
}

function eachPartArc(
	{ ringArcs, ringStarts, partRings }: Coverage,
	visit: (part: number, arc: number) => void,
) {
	for (let part = 0; part + 1 < partRings.length; part++) {
		for (let i = ringStarts[partRings[part]]; i < ringStarts[partRings[part + 1]]; i++)
			visit(part, ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i]);
	}
}

/** Joins parts that share an arc. Out: a part of each arc, -1 for none. */
function joinTouching(coverage: Coverage, join: (a: number, b: number) => void): Int32Array {
	const first = new Int32Array(coverage.arcStarts.length - 1).fill(-1);
	eachPartArc(coverage, (part, arc) => {
		if (first[arc] < 0) first[arc] = part;
		else join(part, first[arc]);
	});
	return first;
}

interface Place {
	part: number;
	x: number;
	y: number;
	z: number;
}

/** Key of a cell of a grid in space. */
const cellOf = (x: number, y: number, z: number, side: number): string =>
	`${Math.floor(x / side)} ${Math.floor(y / side)} ${Math.floor(z / side)}`;

/** Places along the coasts, in km from the middle of the globe, at most one a small cell and part. */
function coastPlaces(coverage: Coverage, partOf: Int32Array, gap: number): Place[] {
	const { arcPoints, arcStarts, arcLeft, arcRight } = coverage;
	const places: Place[] = [];
	const taken = new Set<string>();
	const put = (part: number, [lon, lat]: LonLat) => {
		const [l, b] = [(lon * Math.PI) / 180, (lat * Math.PI) / 180];
		const [x, y] = [earthKm * Math.cos(b) * Math.cos(l), earthKm * Math.cos(b) * Math.sin(l)];
		const z = earthKm * Math.sin(b);
		const key = `${part} ${cellOf(x, y, z, gap / 10)}`;
		if (taken.has(key)) return;
		taken.add(key);
		places.push({ part, x, y, z });
	};
	for (let arc = 0; arc < partOf.length; arc++) {
		if (partOf[arc] < 0 || (arcLeft[arc] >= 0 && arcRight[arc] >= 0)) continue;
		const points: LonLat[] = [];
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++)
			points.push([arcPoints[2 * point], arcPoints[2 * point + 1]]);
		runOn(points).forEach((here, i) => {
			const before = points[i - 1] ?? here;
			const far = Math.max(Math.abs(here[0] - before[0]), Math.abs(here[1] - before[1]));
			const steps = Math.max(1, Math.ceil((far * 111) / (gap / 3)));
			for (let step = 1; step <= steps; step++)
				put(partOf[arc], [
					before[0] + ((here[0] - before[0]) * step) / steps,
					before[1] + ((here[1] - before[1]) * step) / steps,
				]);
		});
	}
	return places;
}

/** Joins parts with places nearer than the gap: by cells of a grid, each with the cells around it. */
function joinNear(
	places: Place[],
	gap: number,
	find: (part: number) => number,
	join: (a: number, b: number) => void,
): void {
	const cells = new Map<string, Place[]>();
	for (const place of places) {
		const key = cellOf(place.x, place.y, place.z, gap);
		const list = cells.get(key);
		if (list) list.push(place);
		else cells.set(key, [place]);
	}
	for (const list of cells.values()) {
		const { x, y, z } = list[0];
		// the cell itself and half of those around it: the other half has this one as its neighbour
		for (let i = 13; i < 27; i++) {
			const [dx, dy, dz] = [(i % 3) - 1, (Math.floor(i / 3) % 3) - 1, Math.floor(i / 9) - 1];
			const other = cells.get(cellOf(x + dx * gap, y + dy * gap, z + dz * gap, gap));
			if (other) joinCells(list, other, gap, find, join);
		}
	}
}

function joinCells(
	a: Place[],
	b: Place[],
	gap: number,
	find: (part: number) => number,
	join: (a: number, b: number) => void,
): void {
	const root = find(a[0].part);
	const alone = (list: Place[]) => list.every(({ part }) => find(part) === root);
	if (alone(a) && alone(b)) return;
	for (const one of a) {
		for (const other of b) {
			if (find(one.part) === find(other.part)) continue;
			if (Math.hypot(one.x - other.x, one.y - other.y, one.z - other.z) <= gap)
				join(one.part, other.part);
		}
	}
}

function clusterOf(coverage: Coverage, parts: number[], areas: Float64Array): Cluster {
	const { keys, regionParts, arcPoints, arcStarts, ringArcs, ringStarts, partRings } = coverage;
	const byRegion = new Map<number, number>();
	let [region, areaKm2] = [0, 0];
	for (const part of parts) {
		while (regionParts[region + 1] <= part) region++;
		byRegion.set(region, (byRegion.get(region) ?? 0) + areas[part]);
		areaKm2 += areas[part];
	}
	const largest = parts.reduce((best, part) => (areas[part] > areas[best] ? part : best), parts[0]);
	const owner = regionParts.findIndex(
		(first, i) => first <= largest && largest < regionParts[i + 1],
	);
	const arc = ringArcs[ringStarts[partRings[largest]]];
	const at = 2 * arcStarts[arc < 0 ? ~arc : arc];
	const place: [number, number] = [arcPoints[at], arcPoints[at + 1]];
	const regions = [...byRegion].map(([number, area]) => ({ region: number, areaKm2: area }));
	return {
		id: `${keys[owner]} @ ${place.map(Math.round).join(' ')}`,
		at: place,
		...{ parts, areaKm2 },
		regions: regions.sort((a, b) => b.areaKm2 - a.areaKm2 || a.region - b.region),
	};
}
