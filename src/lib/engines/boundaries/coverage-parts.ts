import type { Coverage } from '../geometry/coverage.ts';
import { ringPoints } from '../geometry/coverage-rings.ts';

/** Rings of a part: the outer one, then its holes. */
export function ringsOfPart(coverage: Coverage, part: number): Float64Array[] {
	const rings: Float64Array[] = [];
	for (let ring = coverage.partRings[part]; ring < coverage.partRings[part + 1]; ring++) {
		rings.push(ringPoints(coverage, ring));
	}
	return rings;
}

/** Metres of a ring along each region on its other side; -1 stands for nobody. */
export function metresAlong(coverage: Coverage, ring: number): Map<number, number> {
	const { ringArcs, ringStarts, arcLeft, arcRight, arcMetres } = coverage;
	const along = new Map<number, number>();
	for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
		const half = ringArcs[i];
		const arc = half >= 0 ? half : ~half;
		const other = half >= 0 ? arcRight[arc] : arcLeft[arc];
		along.set(other, (along.get(other) ?? 0) + arcMetres[arc]);
	}
	return along;
}
