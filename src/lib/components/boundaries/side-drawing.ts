import type { Coverage } from '$lib/engines/boundaries/coverage';

/** West, south, east, north in degrees. */
export type Box = [number, number, number, number];

/** One version of the boundaries, ready to be drawn again and again. */
export interface Side {
	coverage: Coverage;
	numbers: Map<string, number>;
	/** four numbers a region */
	boxes: Float64Array;
	box: Box;
}

export interface Frame {
	box: Box;
	width: number;
	height: number;
}

export interface SideDrawing {
	/** outlines of all regions in the frame */
	land: string;
	/** outlines of the regions that change */
	marked: string;
	chosen: string;
}

const nowhere: Box = [Infinity, Infinity, -Infinity, -Infinity];

export function sideOf(coverage: Coverage): Side {
	const { keys, regionParts, partRings, ringStarts, ringArcs, arcStarts, arcPoints } = coverage;
	const boxes = new Float64Array(4 * keys.length);
	const all: Box = [...nowhere];
	for (let region = 0; region < keys.length; region++) {
		const box: Box = [...nowhere];
		for (let part = regionParts[region]; part < regionParts[region + 1]; part++) {
			const ring = partRings[part];
			for (let at = ringStarts[ring]; at < ringStarts[ring + 1]; at++) {
				const arc = ringArcs[at] < 0 ? ~ringArcs[at] : ringArcs[at];
				for (let p = arcStarts[arc]; p < arcStarts[arc + 1]; p++)
					widen(box, arcPoints[2 * p], arcPoints[2 * p + 1]);
			}
		}
		boxes.set(box, 4 * region);
		join(all, box);
	}
	return { coverage, numbers: new Map(keys.map((key, i) => [key, i])), boxes, box: all };
}

function widen(box: Box, x: number, y: number): void {
	if (x < box[0]) box[0] = x;
	if (y < box[1]) box[1] = y;
	if (x > box[2]) box[2] = x;
	if (y > box[3]) box[3] = y;
}

export function join(box: Box, other: ArrayLike<number>): void {
	widen(box, other[0], other[1]);
	widen(box, other[2], other[3]);
}

/** The box of these regions, or null where none of them is on this side. */
export function boxOf({ numbers, boxes }: Side, keys: readonly string[]): Box | null {
	const box: Box = [...nowhere];
	for (const key of keys) {
		const region = numbers.get(key);
		if (region !== undefined) join(box, boxes.subarray(4 * region, 4 * region + 4));
	}
	return box[0] <= box[2] ? box : null;
}

const width = 1000;
/** of the frame, as height for width: two beside each other leave room for a table below */
const shape = 0.56;

/** A frame round a box, both sides alike: narrowed as the middle parallel asks, with some air. */
export function frameOf(inner: Box, air: number): Frame {
	const [west, south, east, north] = inner;
	const narrow = narrowing(inner);
	const across = Math.max((east - west) * narrow, 1e-5) * (1 + air);
	const up = Math.max(north - south, 1e-5) * (1 + air);
	const half = Math.max(across / 2, up / 2 / shape);
	const [x, y] = [(west + east) / 2, (south + north) / 2];
	const box: Box = [x - half / narrow, y - half * shape, x + half / narrow, y + half * shape];
	return { box, width, height: Math.round(width * shape) };
}

/** The same frame round its middle, or round a place, a quarter as wide for each step. */
export function closer(frame: Frame, at: [number, number] | null, steps: number): Frame {
	if (!steps) return frame;
	const [west, south, east, north] = frame.box;
	const [x, y] = at ?? [(west + east) / 2, (south + north) / 2];
	const [dx, dy] = [(east - west) / 2 / 4 ** steps, (north - south) / 2 / 4 ** steps];
	return { ...frame, box: [x - dx, y - dy, x + dx, y + dy] };
}

/** How wide a frame is on the ground at its middle, on a sphere of the mean radius. */
export const widthMetres = ({ box: [west, south, east, north] }: Frame): number =>
	(east - west) * narrowing([west, south, east, north]) * 111_195;

const narrowing = ([, south, , north]: Box) =>
	Math.max(0.05, Math.cos((Math.max(-85, Math.min(85, (south + north) / 2)) * Math.PI) / 180));

/** Points nearer than this to the last one kept are left out; the frame is 1,000 wide. */
const thin = 0.7;

export function drawSide(
	side: Side,
	frame: Frame,
	marked: readonly string[],
	chosen: readonly string[],
): SideDrawing {
	const { boxes, coverage, numbers } = side;
	const [west, south, east, north] = frame.box;
	const arcText = arcsIn(coverage, frame);
	const seen = (region: number) =>
		boxes[4 * region] <= east &&
		boxes[4 * region + 2] >= west &&
		boxes[4 * region + 1] <= north &&
		boxes[4 * region + 3] >= south;
	const paths = (regions: Iterable<number>) => {
		const out: string[] = [];
		for (const region of regions) if (seen(region)) out.push(regionPath(coverage, region, arcText));
		return out.join('');
	};
	const named = (keys: readonly string[]) => keys.flatMap((key) => numbers.get(key) ?? []);
	return {
		land: paths(coverage.keys.keys()),
		marked: paths(named(marked)),
		chosen: paths(named(chosen)),
	};
}

/** Text of an arc's points but the first, walked forward or backward; made once each. */
function arcsIn({ arcPoints, arcStarts }: Coverage, { box, width: across, height }: Frame) {
	const [west, south, east, north] = box;
	const known = new Map<number, { first: string; rest: string }>();
	return (half: number) => {
		const found = known.get(half);
		if (found) return found;
		const arc = half < 0 ? ~half : half;
		const points: [number, number][] = [];
		const last = arcStarts[arc + 1] - 1;
		for (let p = arcStarts[arc]; p <= last; p++) {
			const x = ((arcPoints[2 * p] - west) / (east - west)) * across;
			const y = ((north - arcPoints[2 * p + 1]) / (north - south)) * height;
			const before = points.at(-1);
			if (!before || p === last || Math.hypot(x - before[0], y - before[1]) >= thin)
				points.push([x, y]);
		}
		if (half < 0) points.reverse();
		const text = points.map(([x, y]) => `${Math.round(x * 10) / 10} ${Math.round(y * 10) / 10}`);
		const made = { first: text[0], rest: text.slice(1).join('L') };
		known.set(half, made);
		return made;
	};
}

type ArcText = ReturnType<typeof arcsIn>;

function regionPath(coverage: Coverage, region: number, arcText: ArcText): string {
	const { regionParts, partRings, ringStarts, ringArcs } = coverage;
	let path = '';
	for (
		let ring = partRings[regionParts[region]];
		ring < partRings[regionParts[region + 1]];
		ring++
	) {
		for (let at = ringStarts[ring]; at < ringStarts[ring + 1]; at++) {
			const { first, rest } = arcText(ringArcs[at]);
			path += at === ringStarts[ring] ? `M${first}L${rest}` : `L${rest}`;
		}
		path += 'Z';
	}
	return path;
}

/** Where a place lies in a frame. */
export function placeIn({ box, width: across, height }: Frame, [lon, lat]: [number, number]) {
	const [west, south, east, north] = box;
	return {
		x: Math.round(((lon - west) / (east - west)) * across * 10) / 10,
		y: Math.round(((north - lat) / (north - south)) * height * 10) / 10,
	};
}
