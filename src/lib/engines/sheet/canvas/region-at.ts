import type { Ground } from './ground.ts';

/**
 * The region that a place on the paper lies in, or -1. In: hundredths of a millimetre. By counting the
 * lines to the right of the place (even and odd), in the regions whose box holds it; where regions
 * overlap, the one painted last. Time: a comparison a region, then the points of one or two.
 */
export function regionAt(ground: Ground, x: number, y: number): number {
	const { regionBoxes } = ground;
	for (let region = regionBoxes.length / 4 - 1; region >= 0; region--) {
		const at = 4 * region;
		if (x < regionBoxes[at] || x > regionBoxes[at + 2]) continue;
		if (y < regionBoxes[at + 1] || y > regionBoxes[at + 3]) continue;
		if (contains(ground, region, x, y)) return region;
	}
	return -1;
}

function contains(ground: Ground, region: number, x: number, y: number): boolean {
	const { arcPoints, arcStarts, ringArcs, ringStarts, regionRings } = ground;
	let inside = false;
	const end = ringStarts[regionRings[region + 1]];
	for (let i = ringStarts[regionRings[region]]; i < end; i++) {
		const arc = ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i];
		for (let point = arcStarts[arc]; point + 1 < arcStarts[arc + 1]; point++) {
			const [y1, y2] = [arcPoints[2 * point + 1], arcPoints[2 * point + 3]];
			if (y1 > y === y2 > y) continue;
			const [x1, x2] = [arcPoints[2 * point], arcPoints[2 * point + 2]];
			if (x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)) inside = !inside;
		}
	}
	return inside;
}
