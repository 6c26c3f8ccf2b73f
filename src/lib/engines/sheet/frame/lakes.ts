/**
 * Gaps that regions enclose, as closed paths on the paper. In: the coverage's outer edges and where they
 * came to lie; the sides of the lines that are drawn. Out: one path a gap. Walked with the gap on the left, taking the leftmost way where several
 * edges meet, a gap runs anticlockwise and the ground around the regions clockwise (faces of a planar map,
 * as in Edmonds 1960). Gaps across the cut of the map are left out.
 */
import type { Coverage } from '../../boundaries/coverage.ts';
import { ringDoubleArea, ringPoints } from '../fills.ts';
import type { ArcSides } from '../lines.ts';
import type { SheetArcs } from '../plane/quantise.ts';

/** Smaller gaps, in square hundredths of a millimetre, are slips of the file or not to be seen. */
const least = 400;

export function enclosedGaps(coverage: Coverage, arcs: SheetArcs, drawn: ArcSides): number[][] {
	// an edge that is drawn in pieces, or not, was cut by the supplier or by the map
	const isCut = (edge: number) => {
		const arc = edge < 0 ? ~edge : edge;
		return drawn.arcLeft[arc] < 0 && drawn.arcRight[arc] < 0;
	};
	const edges = outerEdges(coverage);
	const leaving = new Map<string, number[]>();
	for (const edge of edges) {
		const key = endOf(coverage, edge, 0);
		leaving.set(key, [...(leaving.get(key) ?? []), edge]);
	}
	const used = new Set<number>();
	const gaps: number[][] = [];
	for (const edge of edges) {
		if (used.has(edge)) continue;
		const ring = walk(coverage, edge, leaving, used);
		if (!ring || ring.some(isCut)) continue;
		const points = ringPoints(arcs, Int32Array.from(ring));
		if (points.length >= 6 && ringDoubleArea(points) > 2 * least) gaps.push(points);
	}
	return gaps;
}

/** Arcs with nobody on one side, signed so that nobody is on the left. */
function outerEdges({ arcLeft, arcRight }: Coverage): number[] {
	const edges: number[] = [];
	arcLeft.forEach((left, arc) => {
		if (left < 0 && arcRight[arc] >= 0) edges.push(arc);
		else if (arcRight[arc] < 0 && left >= 0) edges.push(~arc);
	});
	return edges;
}

/** Index of a point of an edge, counted from its start, or from its end if negative. */
function pointOf({ arcStarts }: Coverage, edge: number, step: number): number {
	const arc = edge < 0 ? ~edge : edge;
	const fromStart = step >= 0 === edge >= 0;
	const by = step >= 0 ? step : -step - 1;
	return fromStart ? arcStarts[arc] + by : arcStarts[arc + 1] - 1 - by;
}

function endOf(coverage: Coverage, edge: number, step: number): string {
	const at = 2 * pointOf(coverage, edge, step);
	return `${coverage.arcPoints[at]} ${coverage.arcPoints[at + 1]}`;
}

function heading({ arcPoints }: Coverage, from: number, to: number): number {
	return Math.atan2(
		arcPoints[2 * to + 1] - arcPoints[2 * from + 1],
		arcPoints[2 * to] - arcPoints[2 * from],
	);
}

/** The edge that turns furthest to the left at the end of another. */
function next(coverage: Coverage, edge: number, choices: number[]): number | undefined {
	if (choices.length < 2) return choices[0];
	const back = heading(coverage, pointOf(coverage, edge, -1), pointOf(coverage, edge, -2));
	const turn = (one: number) => {
		const ahead = heading(coverage, pointOf(coverage, one, 0), pointOf(coverage, one, 1));
		const clockwise = back - ahead;
		return clockwise <= 1e-12 ? clockwise + 2 * Math.PI : clockwise;
	};
	return choices.reduce((best, one) => (turn(one) < turn(best) ? one : best));
}

function walk(
	coverage: Coverage,
	first: number,
	leaving: Map<string, number[]>,
	used: Set<number>,
): number[] | null {
	const ring: number[] = [];
	let edge: number | undefined = first;
	while (edge !== undefined && !used.has(edge)) {
		used.add(edge);
		ring.push(edge);
		const choices: number[] = leaving.get(endOf(coverage, edge, -1)) ?? [];
		edge = next(coverage, edge, choices);
	}
	return edge === first ? ring : null;
}
