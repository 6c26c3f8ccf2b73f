/**
 * A place inside an area of rings (even-odd): half way along the widest stretch of the area at the middle
 * of its latitudes. The middle is moved a little where it runs along an edge.
 */
export function insidePlace(rings: Float64Array[]): [number, number] {
	let [south, north] = [Infinity, -Infinity];
	for (let i = 1; i < rings[0].length; i += 2) {
		south = Math.min(south, rings[0][i]);
		north = Math.max(north, rings[0][i]);
	}
	let best: [number, number] = [rings[0][0], rings[0][1]];
	let widest = -1;
	for (const share of shares) {
		const y = south + share * (north - south);
		const xs = rings.flatMap((ring) => crossingsAt(ring, y)).sort((p, q) => p - q);
		for (let i = 0; i + 1 < xs.length; i += 2) {
			if (xs[i + 1] - xs[i] <= widest) continue;
			widest = xs[i + 1] - xs[i];
			best = [(xs[i] + xs[i + 1]) / 2, y];
		}
		if (widest > 0) break;
	}
	return best;
}

/** No simple fraction, so that it seldom runs through a corner. */
const shares = [0.50317, 0.26133, 0.74779, 0.10411];

/** Longitudes at which a ring passes a latitude. */
function crossingsAt(ring: Float64Array, y: number): number[] {
	const xs: number[] = [];
	for (let i = 0; i < ring.length; i += 2) {
		const j = (i + 2) % ring.length;
		const [x1, y1, x2, y2] = [ring[i], ring[i + 1], ring[j], ring[j + 1]];
		if (y1 > y !== y2 > y) xs.push(x1 + ((y - y1) / (y2 - y1)) * (x2 - x1));
	}
	return xs;
}
