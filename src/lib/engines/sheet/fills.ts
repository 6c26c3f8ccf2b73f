import type { SheetArcs } from './plane/quantise.ts';

const arcOf = (signed: number): number => (signed < 0 ? ~signed : signed);

/**
 * The rings of every region without arcs that shrank to one point and without rings of fewer than
 * three places, which would paint nothing. A region may be left with no ring at all.
 */
export function drawnRings(regions: Int32Array[][], { arcStarts }: SheetArcs): Int32Array[][] {
	const steps = (signed: number) => arcStarts[arcOf(signed) + 1] - arcStarts[arcOf(signed)] - 1;
	return regions.map((rings) =>
		rings
			.map((ring) => ring.filter((signed) => steps(signed) > 0))
			.filter((ring) => ring.reduce((sum, signed) => sum + steps(signed), 0) >= 3),
	);
}

/** Points of one ring on the paper, x and y interleaved, the first not repeated at the end. */
export function ringPoints({ arcPoints, arcStarts }: SheetArcs, ring: Int32Array): number[] {
	const points: number[] = [];
	for (const signed of ring) {
		const arc = arcOf(signed);
		const [start, end] = [arcStarts[arc], arcStarts[arc + 1]];
		for (let step = 0; step < end - start - 1; step++) {
			const point = signed < 0 ? end - 1 - step : start + step;
			points.push(arcPoints[2 * point], arcPoints[2 * point + 1]);
		}
	}
	return points;
}

/** Twice the area a ring encloses, in square hundredths; positive when it runs anticlockwise on paper. */
export function ringDoubleArea(points: ArrayLike<number>): number {
	let sum = 0;
	for (let i = 0, j = points.length - 2; i < points.length; j = i, i += 2) {
		sum += points[i] * points[j + 1] - points[j] * points[i + 1];
	}
	return sum;
}
