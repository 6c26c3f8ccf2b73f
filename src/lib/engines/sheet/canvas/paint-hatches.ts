import type { Hatch } from '../../palettes/palette.ts';
import { ringPoints } from '../fills.ts';
import { cutLines } from '../hatch/cut-lines.ts';
import { cutKey, familiesOf, hatchWidth } from '../hatch/hatch-look.ts';
import { meets, type Area, type Ground } from './ground.ts';
import type { Pen } from './paint-area.ts';

/** Which regions are hatched, and how. */
export interface Hatching {
	/** colours as the reader sees them */
	looks: Hatch[];
	/** 1 + place in `looks` of every region, 0 for none */
	of: Uint8Array;
}

/** Lines in one stroke. */
const linesAStroke = 400;

/** What was cut of a ground's regions so far: every tile that shows a region needs the same lines. */
const cut = new WeakMap<Ground, Map<number, { key: string; segments: number[] }>>();

function linesOf(ground: Ground, region: number, hatch: Hatch): number[] {
	const known = cut.get(ground) ?? new Map<number, { key: string; segments: number[] }>();
	cut.set(ground, known);
	const key = cutKey(hatch);
	const before = known.get(region);
	if (before?.key === key) return before.segments;
	const points: number[][] = [];
	const { regionRings, ringStarts, ringArcs } = ground;
	for (let ring = regionRings[region]; ring < regionRings[region + 1]; ring++)
		points.push(ringPoints(ground, ringArcs.subarray(ringStarts[ring], ringStarts[ring + 1])));
	const segments = familiesOf(hatch).flatMap((family) => cutLines(points, family));
	known.set(region, { key, segments });
	return segments;
}

/** Hatches of the regions that meet an area, cut where the ground has their borders. */
export function paintHatches(
	pen: Pen,
	ground: Ground,
	{ looks, of }: Hatching,
	area: Area,
	alphaOf: (region: number) => number,
): void {
	pen.lineCap = 'butt';
	pen.setLineDash([]);
	looks.forEach((hatch, look) => {
		pen.strokeStyle = hatch.hex;
		pen.lineWidth = Math.max(3, hatchWidth(hatch));
		for (let region = 0; region < of.length; region++) {
			if (of[region] !== look + 1 || !meets(ground.regionBoxes, region, area)) continue;
			pen.globalAlpha = alphaOf(region);
			strokeLines(pen, linesOf(ground, region, hatch), area);
		}
	});
	pen.globalAlpha = 1;
}

function strokeLines(pen: Pen, segments: number[], area: Area): void {
	let open = 0;
	for (let i = 0; i < segments.length; i += 4) {
		const [x1, y1, x2, y2] = [segments[i], segments[i + 1], segments[i + 2], segments[i + 3]];
		if (Math.max(x1, x2) < area.left || Math.min(x1, x2) > area.right) continue;
		if (Math.max(y1, y2) < area.top || Math.min(y1, y2) > area.bottom) continue;
		if (open === 0) pen.beginPath();
		pen.moveTo(x1, y1);
		pen.lineTo(x2, y2);
		if (++open < linesAStroke) continue;
		pen.stroke();
		open = 0;
	}
	if (open) pen.stroke();
}
