import { geodesicMetres } from '../geometry/ellipsoid.ts';
import { regionOfSegment, type Matched } from './match.ts';
import { eachNearMiss, unmatchedSegments } from './near-misses.ts';
import type { Segments } from './segments.ts';

/** Two regions whose lines run beside each other without meeting. */
export interface ParallelGap {
	a: number;
	b: number;
	/** metres, at the widest of the stretch */
	width: number;
	at: [number, number];
}

/** With more unmatched segments than this (a long fine coast) none are looked for. */
const mostSegments = 300_000;
/** Where the gap is wider than this many times its narrowest, the lines have parted. */
const parted = 3;

/**
 * Pairs that touch nowhere, yet run within `most` metres of each other over at least twice the width of
 * the gap between them.
 */
export function parallelGaps({ noded, survey, coverage }: Matched, most: number): ParallelGap[] {
	const { segments, outlines } = noded;
	const unmatched = unmatchedSegments(segments);
	if (unmatched.length > mostSegments) return [];
	const regions = coverage.keys.length;
	const { a, b } = survey.borders;
	const touching = new Set(Array.from(a, (r, i) => r * regions + b[i]));
	const owners = ownersOf(unmatched, segments);
	const near = new Map<number, Map<number, number>>();
	eachNearMiss(segments, outlines.positions, most, ({ point, segment, metres }) => {
		const other = regionOfSegment(segments, segment);
		for (const owner of owners.get(point) ?? []) {
			if (owner === other) continue;
			const code = Math.min(owner, other) * regions + Math.max(owner, other);
			if (touching.has(code)) continue;
			const points = near.get(code) ?? new Map<number, number>();
			near.set(code, points.set(point, Math.min(metres, points.get(point) ?? Infinity)));
		}
	});
	return [...near].flatMap(([code, points]) => {
		const stretch = stretchOf(points, outlines.positions);
		return stretch ? [{ a: Math.floor(code / regions), b: code % regions, ...stretch }] : [];
	});
}

function ownersOf(list: Uint32Array, segments: Segments): Map<number, number[]> {
	const owners = new Map<number, number[]>();
	for (const s of list) {
		const region = regionOfSegment(segments, s);
		for (const v of [segments.low[s], segments.high[s]]) {
			const known = owners.get(v);
			if (!known) owners.set(v, [region]);
			else if (!known.includes(region)) known.push(region);
		}
	}
	return owners;
}

/** The corners beside the other line before the two part, when they run on far enough. */
function stretchOf(points: Map<number, number>, positions: Float64Array) {
	const order = [...points].sort((p, q) => p[1] - q[1] || p[0] - q[0]);
	const limit = Math.max(order[0][1] * parted, order[0][1] + 1);
	const along = order.filter(([, metres]) => metres <= limit);
	const width = along[along.length - 1][1];
	const place = (v: number): [number, number] => [positions[2 * v], positions[2 * v + 1]];
	const first = place(along[0][0]);
	const reach = Math.max(...along.map(([v]) => geodesicMetres(...first, ...place(v))));
	return reach >= 2 * width ? { width, at: first } : null;
}
