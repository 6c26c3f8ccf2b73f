import type { Coverage } from '../geometry/coverage.ts';
import { boxOf, ringPoints } from '../geometry/coverage-rings.ts';
import type { PartedGraph } from '../graph/index.ts';
import type { BorderList } from './border-list.ts';

/**
 * Which parts of the regions border which, for the pairs of a list: by the lines they share; where two
 * regions share none, by the parts that lie nearest to the place of the border; those pairs are loose.
 */
export function partedBorders(
	coverage: Coverage,
	list: Pick<BorderList, 'a' | 'b' | 'at'>,
): PartedGraph {
	const byLine = partsAlongLines(coverage);
	const a: number[] = [];
	const b: number[] = [];
	const loose: number[] = [];
	for (let i = 0; i < list.a.length; i++) {
		const [p, q] = [list.a[i], list.b[i]];
		const shared = byLine.get(p * coverage.keys.length + q);
		const [x, y] = list.at.subarray(2 * i, 2 * i + 2);
		const nearest = (region: number) => nearestPart(coverage, region, x, y);
		if (!shared) loose.push(a.length);
		const pairs = shared ?? [[nearest(p), nearest(q)]];
		for (const [x, y] of pairs) {
			a.push(x);
			b.push(y);
		}
	}
	return { regions: coverage.keys.length, owner: ownersOf(coverage), a, b, loose };
}

function ownersOf({ regionParts, partRings, keys }: Coverage): Int32Array {
	const owner = new Int32Array(partRings.length - 1);
	for (let region = 0; region < keys.length; region++) {
		owner.fill(region, regionParts[region], regionParts[region + 1]);
	}
	return owner;
}

/** Pairs of parts on either side of an arc, by the pair of regions (smaller number first). */
function partsAlongLines(coverage: Coverage): Map<number, [number, number][]> {
	const { arcLeft, arcRight, keys } = coverage;
	const { left, right } = partsBeside(coverage);
	const pairs = new Map<number, [number, number][]>();
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (left[arc] < 0 || right[arc] < 0 || arcLeft[arc] === arcRight[arc]) continue;
		const turned = arcLeft[arc] > arcRight[arc];
		const [p, q] = turned ? [arcRight[arc], arcLeft[arc]] : [arcLeft[arc], arcRight[arc]];
		const [x, y] = turned ? [right[arc], left[arc]] : [left[arc], right[arc]];
		const code = p * keys.length + q;
		const known = pairs.get(code);
		if (!known) pairs.set(code, [[x, y]]);
		else if (!known.some((pair) => pair[0] === x && pair[1] === y)) known.push([x, y]);
	}
	return pairs;
}

/** The part on either side of each arc, -1 for none: rings run with their region on the left. */
function partsBeside({ arcLeft, partRings, ringStarts, ringArcs }: Coverage) {
	const left = new Int32Array(arcLeft.length).fill(-1);
	const right = left.slice();
	for (let part = 0; part + 1 < partRings.length; part++) {
		const end = ringStarts[partRings[part + 1]];
		for (let i = ringStarts[partRings[part]]; i < end; i++) {
			if (ringArcs[i] >= 0) left[ringArcs[i]] = part;
			else right[~ringArcs[i]] = part;
		}
	}
	return { left, right };
}

/** The part of a region whose box is nearest to a place, in degrees; the first where the place is none. */
function nearestPart(coverage: Coverage, region: number, x: number, y: number): number {
	const { regionParts, partRings } = coverage;
	let best = regionParts[region];
	let least = Infinity;
	for (let part = regionParts[region]; part < regionParts[region + 1]; part++) {
		const [west, south, east, north] = boxOf(ringPoints(coverage, partRings[part]));
		const distance = Math.hypot(Math.max(west - x, 0, x - east), Math.max(south - y, 0, y - north));
		if (distance < least) [best, least] = [part, distance];
	}
	return best;
}
