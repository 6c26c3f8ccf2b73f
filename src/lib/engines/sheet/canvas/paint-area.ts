import type { LineLayer } from '../drawing.ts';
import { shapeLayersOver, shapeLayersUnder, type DrawnShape } from '../shapes.ts';
import { meets, type Area, type Ground } from './ground.ts';
import { strokeChains } from './stroke-chains.ts';
import { paintHatches, type Hatching } from './paint-hatches.ts';
import { paintShapes } from './paint-shapes.ts';

/** What is asked of a canvas: the part of its two-dimensional context that painting needs. */
export type Pen = Pick<
	CanvasRenderingContext2D,
	| 'beginPath'
	| 'moveTo'
	| 'lineTo'
	| 'closePath'
	| 'fill'
	| 'stroke'
	| 'fillRect'
	| 'setTransform'
	| 'fillStyle'
	| 'strokeStyle'
	| 'lineWidth'
	| 'lineJoin'
	| 'lineCap'
	| 'globalAlpha'
	| 'setLineDash'
>;

export interface Colours {
	/** as the reader sees them */
	hexes: string[];
	/** place in `hexes` of every region */
	of: Uint8Array;
	/** 1 for a region that steps back; null for none */
	faded: Uint8Array | null;
	hatching?: Hatching | null;
}

/** Lines laid over all others, as wide on the screen whatever the size of the sheet. */
export interface Outline {
	arcs: Uint32Array;
	hex: string;
	/** pixels of the canvas */
	width: number;
}

export interface Picture {
	ground: Ground;
	lines: LineLayer[];
	/** those below border lines are painted; frames, grounds and legend stay with the lettering */
	shapes: DrawnShape[];
	colours: Colours;
	outline: Outline | null;
}

/** Regions and arcs in one path: one path for each takes long, and so does one for all. */
const regionsAPath = 40;
const arcsAPath = 200;
/** what is left of a colour that steps back, as on the inline sheet */
const fadedAlpha = 0.18;

/**
 * Paints a part of a drawing: shapes and fills in their order, then lines by rank, then the outline. In: `scale`, pixels to a
 * hundredth of a millimetre; the area's top left corner comes to the canvas's. Out: the pixels that the
 * SVG painter's text gives, but for lettering and collar furniture, which stay text. Only what meets the
 * area is painted.
 */
export function paintArea(pen: Pen, picture: Picture, area: Area, scale: number): void {
	pen.setTransform(1, 0, 0, 1, 0, 0);
	pen.fillStyle = '#ffffff';
	pen.fillRect(0, 0, (area.right - area.left) * scale, (area.bottom - area.top) * scale);
	pen.setTransform(scale, 0, 0, scale, -area.left * scale, -area.top * scale);
	paintShapes(pen, picture.shapes, shapeLayersUnder, area);
	paintFills(pen, picture, area);
	paintShapes(pen, picture.shapes, ['lakes', 'hatch'], area);
	const { hatching, faded } = picture.colours;
	const alphaOf = (region: number) => (faded?.[region] ? fadedAlpha : 1);
	if (hatching) paintHatches(pen, picture.ground, hatching, area, alphaOf);
	paintShapes(pen, picture.shapes, shapeLayersOver.slice(2), area);
	pen.lineJoin = 'round';
	pen.lineCap = 'round';
	for (const { arcs, chains, hex, width, dash } of picture.lines) {
		pen.setLineDash(dash ?? []);
		pen.lineCap = dash ? 'butt' : 'round';
		if (chains) strokeChains(pen, picture.ground, chains, { hex, width });
		else strokeArcs(pen, picture.ground, arcs, { hex, width }, grown(area, width));
	}
	pen.setLineDash([]);
	pen.lineCap = 'round';
	if (!picture.outline) return;
	const { arcs, hex, width } = picture.outline;
	strokeArcs(pen, picture.ground, arcs, { hex, width: width / scale }, grown(area, width / scale));
}

const grown = ({ left, top, right, bottom }: Area, by: number): Area => ({
	left: left - by,
	top: top - by,
	right: right + by,
	bottom: bottom + by,
});

function paintFills(pen: Pen, { ground, colours }: Picture, area: Area): void {
	const { of, hexes, faded } = colours;
	const groups: number[][] = hexes.flatMap(() => [[], []]);
	for (let region = 0; region < of.length; region++) {
		if (meets(ground.regionBoxes, region, area))
			groups[2 * of[region] + (faded?.[region] ? 1 : 0)].push(region);
	}
	groups.forEach((regions, group) => {
		pen.fillStyle = hexes[group >> 1];
		pen.globalAlpha = group % 2 ? fadedAlpha : 1;
		for (let from = 0; from < regions.length; from += regionsAPath) {
			pen.beginPath();
			for (const region of regions.slice(from, from + regionsAPath))
				traceRegion(pen, ground, region);
			pen.fill();
		}
	});
	pen.globalAlpha = 1;
}

/** Adds a region's rings to the path that is open. */
export function traceRegion(pen: Pen, ground: Ground, region: number): void {
	const { arcPoints: p, arcStarts, ringArcs, ringStarts, regionRings } = ground;
	for (let ring = regionRings[region]; ring < regionRings[region + 1]; ring++) {
		let open = false;
		for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
			const back = ringArcs[i] < 0;
			const arc = back ? ~ringArcs[i] : ringArcs[i];
			const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
			for (let step = open ? 1 : 0; step <= last - first; step++) {
				const at = 2 * (back ? last - step : first + step);
				if (open) pen.lineTo(p[at], p[at + 1]);
				else pen.moveTo(p[at], p[at + 1]);
				open = true;
			}
		}
		pen.closePath();
	}
}

function strokeArcs(
	pen: Pen,
	ground: Ground,
	arcs: Uint32Array,
	{ hex, width }: { hex: string; width: number },
	area: Area,
): void {
	const { arcPoints: p, arcStarts, arcBoxes } = ground;
	pen.strokeStyle = hex;
	pen.lineWidth = width;
	let open = 0;
	pen.beginPath();
	for (const arc of arcs) {
		const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
		if (last <= first || !meets(arcBoxes, arc, area)) continue;
		pen.moveTo(p[2 * first], p[2 * first + 1]);
		for (let i = first + 1; i <= last; i++) pen.lineTo(p[2 * i], p[2 * i + 1]);
		if (p[2 * first] === p[2 * last] && p[2 * first + 1] === p[2 * last + 1]) pen.closePath();
		if (++open < arcsAPath) continue;
		pen.stroke();
		pen.beginPath();
		open = 0;
	}
	if (open) pen.stroke();
}
