import { signedArea, type Point } from './cells.ts';

const same = (a: Point, b: Point) => a[0] === b[0] && a[1] === b[1];

/**
 * A closed ring in two along the shortest straight cut between two of its corners that leaves about the
 * share given to the first piece, and, where `fits` is given, a first piece that fits. The corners stay.
 */
export function split(
	ring: readonly Point[],
	share: number,
	fits: (piece: Point[]) => boolean = () => true,
): Point[][] {
	const open = ring.slice(0, -1);
	const whole = Math.abs(signedArea([...ring]));
	const cuts: { from: number; to: number; length: number }[] = [];
	for (let from = 0; from < open.length; from++)
		for (let to = 0; to < open.length; to++)
			if (Math.abs(from - to) > 1 && Math.abs(from - to) < open.length - 1)
				cuts.push({
					from,
					to,
					length: Math.hypot(open[from][0] - open[to][0], open[from][1] - open[to][1]),
				});
	cuts.sort((a, b) => a.length - b.length || a.from - b.from || a.to - b.to);
	for (const { from, to } of cuts) {
		const first = run(open, from, to);
		const area = Math.abs(signedArea(first)) / whole;
		if (Math.abs(area - share) > 0.06 || !isInside(open, from, to) || !fits(first)) continue;
		return [first, run(open, to, from)];
	}
	return [];
}

/** The corners from one to another along the ring, closed by the cut between them. */
function run(open: readonly Point[], from: number, to: number): Point[] {
	const out: Point[] = [];
	for (let i = from; i !== to; i = (i + 1) % open.length) out.push(open[i]);
	return [...out, open[to], open[from]];
}

function isInside(open: readonly Point[], from: number, to: number): boolean {
	const [a, b] = [open[from], open[to]];
	const middle: Point = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
	let inside = false;
	for (let i = 0; i < open.length; i++) {
		const [c, d] = [open[i], open[(i + 1) % open.length]];
		if (c[1] > middle[1] !== d[1] > middle[1]) {
			const x = c[0] + ((middle[1] - c[1]) / (d[1] - c[1])) * (d[0] - c[0]);
			if (x > middle[0]) inside = !inside;
		}
		if ([c, d].some((end) => same(end, a) || same(end, b))) continue;
		if (side(a, b, c) !== side(a, b, d) && side(c, d, a) !== side(c, d, b)) return false;
	}
	return inside;
}

const side = (a: Point, b: Point, p: Point) =>
	Math.sign((b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0]));

/** Two rings that share one run of sides, in one; both closed and turning the same way. */
export function joined(one: readonly Point[], other: readonly Point[]): Point[] {
	const key = (p: Point) => p.join();
	const next = new Map<string, Point>();
	const sides = [one, other].flatMap((ring) =>
		ring.slice(1).map((to, i): [Point, Point] => [ring[i], to]),
	);
	const all = new Set(sides.map(([from, to]) => `${key(from)} ${key(to)}`));
	const outer = sides.filter(([from, to]) => !all.has(`${key(to)} ${key(from)}`));
	if (outer.length === sides.length) throw new Error('The rings share no side');
	for (const [from, to] of outer) {
		if (next.has(key(from))) throw new Error('The rings meet in more than one run');
		next.set(key(from), to);
	}
	const ring = [outer[0][0]];
	for (let at = next.get(key(ring[0])); at && !same(at, ring[0]); at = next.get(key(at)))
		ring.push(at);
	if (ring.length !== outer.length) throw new Error('The rings enclose something');
	return [...ring, ring[0]];
}
