/** x, y of each region's anchor on the sheet, interleaved; y grows downward */
export type Anchors = ArrayLike<number>;

export type Direction = 'left' | 'right' | 'up' | 'down';

const vectors: Record<Direction, readonly [number, number]> = {
	left: [-1, 0],
	right: [1, 0],
	up: [0, -1],
	down: [0, 1],
};

/** half the angle a direction covers: neighbours 60 degrees off still count as lying that way */
const neighbourCone = Math.cos(Math.PI / 3);
const anyCone = Math.cos(Math.PI / 4);

/**
 * The region reached by one step from `region`. Bordering regions come first, straightness before
 * nearness; where none lies that way, the nearest region of the whole sheet that does, so that islands
 * can be reached. -1 at the edge of the map.
 */
export function step(
	region: number,
	direction: Direction,
	anchors: Anchors,
	neighbours: Iterable<number>,
): number {
	const near = best(region, direction, anchors, neighbours, neighbourCone);
	return near >= 0 ? near : best(region, direction, anchors, everyRegion(anchors), anyCone);
}

function* everyRegion(anchors: Anchors) {
	for (let region = 0; region < anchors.length / 2; region++) yield region;
}

function best(
	from: number,
	direction: Direction,
	anchors: Anchors,
	candidates: Iterable<number>,
	cone: number,
): number {
	const [dx, dy] = vectors[direction];
	let found = -1;
	let least = Infinity;
	for (const to of candidates) {
		if (to === from) continue;
		const x = anchors[2 * to] - anchors[2 * from];
		const y = anchors[2 * to + 1] - anchors[2 * from + 1];
		const distance = Math.hypot(x, y);
		const straight = (x * dx + y * dy) / (distance || 1);
		if (straight < cone) continue;
		const cost = distance * (1 + 2 * (1 - straight));
		if (cost < least) [found, least] = [to, cost];
	}
	return found;
}

/** The region whose anchor is nearest to a place: where a walk begins. -1 when there is none. */
export function nearestRegion(anchors: Anchors, x: number, y: number): number {
	let found = -1;
	let least = Infinity;
	for (const region of everyRegion(anchors)) {
		const distance = Math.hypot(anchors[2 * region] - x, anchors[2 * region + 1] - y);
		if (distance < least) [found, least] = [region, distance];
	}
	return found;
}
