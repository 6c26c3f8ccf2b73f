import { Inserts } from './inserts.ts';
import { eachNearMiss, unmatchedSegments, type NearMiss } from './near-misses.ts';
import { noiseMetres } from './options.ts';
import { nodeOutlines, remember, type Joined, type Noded } from './node-outlines.ts';
import type { Outlines } from './outlines.ts';
import { rewriteOutlines, type Rewrite } from './rewrite-outlines.ts';
import type { Segments } from './segments.ts';

/**
 * Joins unmatched borders of different regions that run within `tolerance` metres of each other. Of two
 * regions the one whose key comes first keeps its line: the other's vertices move onto it, and its own
 * vertices are put into the other's segments. A region is never joined to itself.
 */
export function joinWithin(given: Noded, tolerance: number, keys: string[]): Noded {
	const rank = ranks(keys);
	let noded = given;
	for (let round = 0; round < rounds; round++) {
		const next = joinOnce(noded, tolerance, rank);
		if (next === noded) break;
		noded = next;
	}
	return noded;
}

/** A corner of three regions is joined to one neighbour a round. */
const rounds = 4;

function joinOnce(noded: Noded, tolerance: number, rank: Int32Array): Noded {
	const { outlines, segments, joined } = noded;
	const owners = ownersOfEnds(segments);
	const nearest = new Map<number, NearMiss>();
	eachNearMiss(segments, outlines.positions, tolerance, (miss) => {
		const other = regionOf(segments, miss.segment);
		if (owners.get(miss.point)?.has(other)) return;
		const best = nearest.get(miss.point);
		if (!best || isNearer(miss, best, segments, rank)) nearest.set(miss.point, miss);
	});
	if (nearest.size === 0) return noded;
	const positions = outlines.positions.slice();
	const moved: Outlines = { ...outlines, positions };
	const rewrite = rewriteFor({ nearest, segments, owners, rank, positions, outlines, joined });
	if (rewrite.inserts.count === 0 && rewrite.standsFor.every((w, v) => w === v)) return noded;
	return { ...nodeOutlines(rewriteOutlines(moved, rewrite)), joined };
}

interface Work {
	nearest: Map<number, NearMiss>;
	segments: Segments;
	owners: Map<number, Set<number>>;
	rank: Int32Array;
	positions: Float64Array;
	outlines: Outlines;
	joined: Joined;
}

function rewriteFor(work: Work): Rewrite {
	const { nearest, segments, owners, rank, positions, outlines, joined } = work;
	const standsFor = new Int32Array(outlines.vertices).map((_, v) => v);
	const inserts = new Inserts(outlines.vertices);
	for (const [point, miss] of nearest) {
		const isAlong = miss.share > 0 && miss.share < 1 && miss.endMetres > noiseMetres;
		const yields = rankOf(owners.get(point), rank) > rank[regionOf(segments, miss.segment)];
		if (!isAlong && !(yields && isBefore(miss.end, point, owners, rank))) continue;
		remember(joined, miss, segments, outlines.positions);
		if (!isAlong) {
			standsFor[point] = miss.end;
			continue;
		}
		if (yields) moveOnto(point, miss, segments, outlines.positions, positions);
		inserts.add(segments.low[miss.segment], segments.high[miss.segment], miss.share, point);
	}
	flatten(standsFor);
	return { inserts, standsFor };
}

/** Vertices are joined towards the lower rank only, so that chains of them end. */
function isBefore(
	q: number,
	p: number,
	owners: Map<number, Set<number>>,
	rank: Int32Array,
): boolean {
	return rankOf(owners.get(q), rank) < rankOf(owners.get(p), rank);
}

/** Follows chains of joined vertices to their last; they end, since each step goes to a lower rank. */
function flatten(standsFor: Int32Array): void {
	for (let v = 0; v < standsFor.length; v++) {
		let root = v;
		while (standsFor[root] !== root) root = standsFor[root];
		standsFor[v] = root;
	}
}

function moveOnto(
	point: number,
	miss: NearMiss,
	segments: Segments,
	from: Float64Array,
	to: Float64Array,
): void {
	const u = 2 * segments.low[miss.segment];
	const v = 2 * segments.high[miss.segment];
	to[2 * point] = from[u] + miss.share * (from[v] - from[u]);
	to[2 * point + 1] = from[u + 1] + miss.share * (from[v + 1] - from[u + 1]);
}

/** Nearest first; at equal distance the region whose key comes first. */
function isNearer(a: NearMiss, b: NearMiss, segments: Segments, rank: Int32Array): boolean {
	const gap = a.metres - b.metres;
	if (Math.abs(gap) > 1e-6) return gap < 0;
	return rank[regionOf(segments, a.segment)] < rank[regionOf(segments, b.segment)];
}

const regionOf = (segments: Segments, s: number) => Math.max(segments.left[s], segments.right[s]);

const rankOf = (owners: Set<number> | undefined, rank: Int32Array) =>
	Math.min(...[...(owners ?? [])].map((region) => rank[region]));

function ownersOfEnds(segments: Segments): Map<number, Set<number>> {
	const owners = new Map<number, Set<number>>();
	const add = (v: number, region: number) => {
		const known = owners.get(v);
		if (known) known.add(region);
		else owners.set(v, new Set([region]));
	};
	for (const s of unmatchedSegments(segments)) {
		const region = regionOf(segments, s);
		add(segments.low[s], region);
		add(segments.high[s], region);
	}
	return owners;
}

function ranks(keys: string[]): Int32Array {
	const order = keys.map((_, r) => r).sort((a, b) => (keys[a] < keys[b] ? -1 : 1));
	const rank = new Int32Array(keys.length);
	order.forEach((r, place) => (rank[r] = place));
	return rank;
}
