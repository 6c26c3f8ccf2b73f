import type { Coverage } from '../geometry/coverage.ts';
import { insidePlace } from '../geometry/inside-place.ts';
import { sourceOf } from './byte-source.ts';
import { ringsOfPart } from './coverage-parts.ts';
import {
	boxAt,
	boxesMeet,
	boxesShare,
	grown,
	isInside,
	outerRegions,
	regionBoxes,
	ringsOfRegion,
	widen,
	type Box,
} from './near-edge.ts';
import { noiseMetres } from './options.ts';
import { readBoundaries } from './read-boundaries.ts';
import { geometryOf } from './to-geojson.ts';

export interface EdgeOptions {
	/** lines of the two sheets within this distance are one; 0.02 m unless given */
	toleranceMetres?: number;
}

/** What two adjoining coverages have to do with each other, regions by number in each. */
export interface EdgeNeighbours {
	/** regions with one key that overlap or touch: the same region, in both or cut in two by the edge */
	same: [a: number, b: number][];
	/** regions with different keys that touch across the edge; 0 metres for a point */
	beside: { a: number; b: number; metres: number; at: [number, number] }[];
}

export type EdgeResult =
	({ status: 'found' } & EdgeNeighbours) | { status: 'refused'; message: string };

/** Boxes that have so much in common are those of one region on two sheets. */
const sameBox = 0.9;

/**
 * Which regions of two coverages are the same and which lie beside each other across the edge. Only regions
 * on the outer edge of one within the extent of the other are looked at, put together and read as one land,
 * so that lines match with different vertices too. Pairs are sorted by a, then b.
 * Failure: `refused` with a sentence where the edge cannot be read as one land.
 */
export async function edgeNeighbours(
	a: Coverage,
	b: Coverage,
	{ toleranceMetres = noiseMetres }: EdgeOptions = {},
): Promise<EdgeResult> {
	const [one, other] = [sideOf(a), sideOf(b)];
	const same = sameOutlines(one, other, toleranceMetres);
	const doubled = new Set(same.map(([, number]) => number));
	const edgeA = edgeRegions(one, other, toleranceMetres);
	const edgeB = edgeRegions(other, one, toleranceMetres).filter((r) => !doubled.has(r));
	if (edgeA.length === 0 || edgeB.length === 0) return { status: 'found', same, beside: [] };
	const read = await readBoundaries(sourceOf('edge', edgeBytes(a, edgeA, b, edgeB)), {
		...{ keyField: 'id', axes: 'lonlat', toleranceMetres },
	});
	if (read.status === 'cancelled') throw new Error('nobody asked to cancel');
	if (read.status === 'refused') return { status: 'refused', message: read.message };
	const beside: EdgeNeighbours['beside'] = [];
	const { borders, coverage } = read;
	for (let i = 0; i < borders.a.length; i++) {
		const pair = across(coverage.keys[borders.a[i]], coverage.keys[borders.b[i]]);
		if (!pair) continue;
		if (a.keys[pair.a] === b.keys[pair.b]) same.push([pair.a, pair.b]);
		else {
			const at: [number, number] = [borders.at[2 * i], borders.at[2 * i + 1]];
			beside.push({ ...pair, metres: borders.metres[i], at });
		}
	}
	same.sort((p, q) => p[0] - q[0]);
	beside.sort((p, q) => p.a - q.a || p.b - q.b);
	return { status: 'found', same, beside };
}

interface Side {
	coverage: Coverage;
	boxes: Float64Array;
	extent: Box;
}

function sideOf(coverage: Coverage): Side {
	const boxes = regionBoxes(coverage);
	const extent: Box = [Infinity, Infinity, -Infinity, -Infinity];
	for (let r = 0; r < coverage.keys.length; r++) widen(extent, boxAt(boxes, r));
	return { coverage, boxes, extent };
}

/** Regions of one key whose boxes are about the same and that overlap. */
function sameOutlines(one: Side, other: Side, tolerance: number): [number, number][] {
	const numbers = new Map(other.coverage.keys.map((key, r) => [key, r]));
	const near = grown(other.extent, tolerance);
	return one.coverage.keys.flatMap((key, a): [number, number][] => {
		const b = numbers.get(key);
		const box = boxAt(one.boxes, a);
		if (b === undefined || !boxesMeet(box, near)) return [];
		const like = boxesShare(box, boxAt(other.boxes, b)) >= sameBox;
		return like && overlap(one.coverage, a, other.coverage, b) ? [[a, b]] : [];
	});
}

/** Whether a place inside the first part of one region lies in the other. */
function overlap(one: Coverage, a: number, other: Coverage, b: number): boolean {
	const place = insidePlace(ringsOfPart(one, one.regionParts[a]));
	return isInside(place, ringsOfRegion(other, b));
}

function edgeRegions({ coverage, boxes }: Side, other: Side, tolerance: number): number[] {
	const outer = outerRegions(coverage);
	const near = grown(other.extent, tolerance);
	return coverage.keys.flatMap((_, r) => (outer[r] && boxesMeet(boxAt(boxes, r), near) ? [r] : []));
}

/** Both edges as one land: `a12` is region 12 of the first coverage. */
function edgeBytes(a: Coverage, edgeA: number[], b: Coverage, edgeB: number[]): Uint8Array {
	const feature = (coverage: Coverage, letter: string) => (region: number) =>
		JSON.stringify({
			...{ type: 'Feature', id: `${letter}${region}`, properties: null },
			geometry: geometryOf(coverage, region),
		});
	const features = [...edgeA.map(feature(a, 'a')), ...edgeB.map(feature(b, 'b'))];
	const text = `{"type":"FeatureCollection","features":[${features.join(',')}]}`;
	return new TextEncoder().encode(text);
}

/** A pair with one region of each, else null. */
function across(p: string, q: string): { a: number; b: number } | null {
	if (p[0] === q[0]) return null;
	const [first, second] = p.startsWith('a') ? [p, q] : [q, p];
	return { a: Number(first.slice(1)), b: Number(second.slice(1)) };
}
