import type { Coverage } from '../geometry/coverage.ts';

/** Whether two regions have the same outline, corner for corner. */
export function isSameOutline(coverage: Coverage, a: number, b: number): boolean {
	const { areasKm2 } = coverage;
	if (Math.abs(areasKm2[a] - areasKm2[b]) > 1e-9 * areasKm2[a]) return false;
	const corners = cornersOf(coverage, a);
	const others = cornersOf(coverage, b);
	return corners.size === others.size && [...corners].every((corner) => others.has(corner));
}

/** Length of the whole outline of a region, holes included. */
export function outlineMetres(coverage: Coverage, region: number): number {
	let metres = 0;
	for (const arc of arcsOf(coverage, region)) metres += coverage.arcMetres[arc];
	return metres;
}

function cornersOf(coverage: Coverage, region: number): Set<string> {
	const corners = new Set<string>();
	const { arcPoints, arcStarts } = coverage;
	for (const arc of arcsOf(coverage, region)) {
		for (let i = 2 * arcStarts[arc]; i < 2 * arcStarts[arc + 1]; i += 2) {
			corners.add(`${arcPoints[i]} ${arcPoints[i + 1]}`);
		}
	}
	return corners;
}

function* arcsOf(coverage: Coverage, region: number): Generator<number> {
	const { regionParts, partRings, ringStarts, ringArcs } = coverage;
	const first = ringStarts[partRings[regionParts[region]]];
	const end = ringStarts[partRings[regionParts[region + 1]]];
	for (let i = first; i < end; i++) yield ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i];
}
