import type { Coverage } from '../geometry/coverage.ts';
import type { PairTally } from './pair-tally.ts';

/** Shared lines: every arc with a region on either side. */
export function addLines(coverage: Coverage, tally: PairTally): void {
	const { arcLeft, arcRight, arcMetres, arcPoints, arcStarts } = coverage;
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (arcLeft[arc] < 0 || arcRight[arc] < 0) continue;
		const first = arcStarts[arc];
		const last = arcStarts[arc + 1] - 1;
		const middle = (first + last) >> 1;
		let x = arcPoints[2 * middle];
		let y = arcPoints[2 * middle + 1];
		if (last - first === 1) {
			x = (x + arcPoints[2 * last]) / 2;
			y = (y + arcPoints[2 * last + 1]) / 2;
		}
		tally.add(arcLeft[arc], arcRight[arc], 0, arcMetres[arc], x, y);
	}
}
