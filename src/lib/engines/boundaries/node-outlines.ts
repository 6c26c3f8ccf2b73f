import { Room } from '../geometry/room.ts';
import { Inserts } from './inserts.ts';
import { eachNearMiss, type NearMiss } from './near-misses.ts';
import { noiseMetres } from './options.ts';
import type { Outlines } from './outlines.ts';
import { rewriteOutlines, type Rewrite } from './rewrite-outlines.ts';
import { indexSegments, type Segments } from './segments.ts';

/** What was joined: regions by number, and a place to look at. */
export interface Joined {
	regions: Set<number>;
	places: number;
	at: [number, number] | null;
}

export interface Noded {
	outlines: Outlines;
	segments: Segments;
	joined: Joined;
	/** memory for who works on these */
	room: Room;
}

const mostRounds = 6;

/**
 * Puts vertices that lie on another segment into it, and takes vertices within 2 cm of each other for
 * one: after this, borders drawn with other vertices on either side match. Of joined vertices the least
 * position stays, so the result does not depend on the order of features. Rounds are repeated until
 * nothing is left to join, since splitting a segment can bring new ends together.
 */
export function nodeOutlines(given: Outlines, room = new Room()): Noded {
	let outlines = given;
	let changed: Uint8Array | null = null;
	const joined: Joined = { regions: new Set(), places: 0, at: null };
	for (let round = 0; ; round++) {
		const segments = indexSegments(outlines, room);
		if (round === mostRounds) return { outlines, segments, joined, room };
		const misses: NearMiss[] = [];
		const keep = (miss: NearMiss) => misses.push(miss);
		eachNearMiss(segments, outlines.positions, noiseMetres, keep, changed);
		if (misses.length === 0) return { outlines, segments, joined, room };
		for (const miss of misses) remember(joined, miss, segments, outlines.positions);
		const rewrite = rewriteFor(misses, segments, outlines);
		changed = changedBy(misses, rewrite);
		outlines = rewriteOutlines(outlines, rewrite);
		giveBack(segments, room);
	}
}

/** Of segments that are to be found anew. */
export function giveBack({ low, high, left, right }: Segments, room: Room): void {
	for (const array of [low, high, left, right]) room.give(array);
}

/** Vertices that new segments end at: those put into others, and those that stand for others. */
function changedBy(misses: NearMiss[], { standsFor }: Rewrite): Uint8Array {
	const changed = new Uint8Array(standsFor.length);
	for (const { point, end } of misses) changed[standsFor[point]] = changed[standsFor[end]] = 1;
	return changed;
}

export function remember(
	joined: Joined,
	miss: NearMiss,
	segments: Segments,
	positions: Float64Array,
): void {
	const { segment, point } = miss;
	joined.regions.add(Math.max(segments.left[segment], segments.right[segment]));
	joined.places++;
	joined.at ??= [positions[2 * point], positions[2 * point + 1]];
}

function rewriteFor(misses: NearMiss[], segments: Segments, outlines: Outlines): Rewrite {
	const standsFor = new Int32Array(outlines.vertices).map((_, v) => v);
	const inserts = new Inserts(outlines.vertices);
	for (const { point, segment, end, endMetres, share } of misses) {
		if (endMetres <= noiseMetres) join(standsFor, point, end, outlines.positions);
		else inserts.add(segments.low[segment], segments.high[segment], share, point);
	}
	for (let v = 0; v < standsFor.length; v++) standsFor[v] = find(standsFor, v);
	return { inserts, standsFor };
}

/** Both stand for whichever has the lesser position. */
function join(standsFor: Int32Array, p: number, q: number, positions: Float64Array): void {
	const a = find(standsFor, p);
	const b = find(standsFor, q);
	if (a === b) return;
	const dx = positions[2 * a] - positions[2 * b];
	const first = dx < 0 || (dx === 0 && positions[2 * a + 1] < positions[2 * b + 1]) ? a : b;
	standsFor[first === a ? b : a] = first;
}

function find(standsFor: Int32Array, v: number): number {
	let root = v;
	while (standsFor[root] !== root) root = standsFor[root];
	standsFor[v] = root;
	return root;
}
