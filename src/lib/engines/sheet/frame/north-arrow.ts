/**
 * A north arrow where it is honest: where north lies within two degrees of straight up all over the map's
 * regions (own rule of the house). Elsewhere the reason, in words.
 */
import type { Box } from '../plane/fit.ts';
import type { DrawnText } from '../drawing.ts';
import { overlaps } from '../graticule/figures.ts';
import { groundAt } from '../graticule/seen-degrees.ts';
import { isFree, type FreeGrid } from '../insets/free-grid.ts';
import type { OnPaper } from '../place-on-paper.ts';
import { spreadPlaces } from '../plane/spread-places.ts';
import type { DrawnShape } from '../shapes.ts';
import { textWidth } from '../type/text-width.ts';

export const honestWithin = 2;
const mostPlaces = 400;
/** Degrees to the north by which north is told. */
const ahead = 0.01;

/** The greatest angle between north and straight up over the map's regions, degrees; null if untold. */
export function northOff({ arcs, arcFrame, chosen, fit }: OnPaper): number | null {
	const { arcPoints, arcStarts } = arcs;
	const count = arcStarts.length - 1;
	const places: number[] = [];
	for (let arc = 0; arc < count; arc++) {
		if (arcFrame && arcFrame[arc] !== 0) continue;
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) places.push(point);
	}
	let worst: number | null = null;
	for (const place of spreadPlaces(arcPoints, places, mostPlaces)) {
		const [x, y] = [arcPoints[2 * place], arcPoints[2 * place + 1]];
		const here = groundAt(chosen.projection, fit, x, y);
		if (!here || Math.abs(here[1]) > 89.9) continue;
		const [x0, y0] = chosen.projection(here)!;
		const [x1, y1] = chosen.projection([here[0], here[1] + ahead])!;
		const off = Math.abs(Math.atan2(x1 - x0, y0 - y1)) * (180 / Math.PI);
		worst = Math.max(worst ?? 0, off);
	}
	return worst;
}

export interface DrawnArrow {
	shapes: DrawnShape[];
	texts: DrawnText[];
	/** why there is none */
	reason: string | null;
}

/** Height on A4, with its letter. */
const high = 1250;

export function northArrow(
	placed: OnPaper,
	grid: FreeGrid,
	scale: number,
	texts: DrawnText[],
	obstacles: readonly Box[],
): DrawnArrow {
	const off = northOff(placed);
	const none = (reason: string) => ({ shapes: [], texts: [], reason });
	if (off === null) return none('Which way is north cannot be told on this map.');
	if (off > honestWithin)
		return none(
			`No north arrow is drawn: north turns up to ${off.toFixed(off < 10 ? 1 : 0)}° away from straight up on this map, and an arrow is honest only within ${honestWithin}°. A graticule shows north everywhere.`,
		);
	const size = { width: Math.round(high * 0.4 * scale), height: Math.round(high * scale) };
	const others = [...placed.insets.map(({ outer }) => outer), ...obstacles];
	const spot = freeCorner(placed.box, grid, size, texts, others);
	if (!spot)
		return none('No north arrow is drawn: there is no free place for it beside the regions.');
	return { ...drawn(spot, scale), reason: null };
}

/** The first free place: the upper right corner, then along the upper edge, then elsewhere at the edges. */
function freeCorner(
	box: Box,
	grid: FreeGrid,
	{ width, height }: { width: number; height: number },
	texts: DrawnText[],
	others: readonly Box[],
): Box | null {
	const air = Math.round(height * 0.2);
	const rights = [box.x + box.width - width - air, box.x + air];
	const tops = [box.y + air, box.y + box.height - height - air];
	const steps = Array.from({ length: 40 }, (_, i) => i / 39);
	const spots = [
		...tops.flatMap((y) => rights.map((x) => ({ x, y }))),
		...tops.flatMap((y) =>
			steps.map((share) => ({ x: rights[0] - share * (rights[0] - rights[1]), y })),
		),
		...rights.flatMap((x) =>
			steps.map((share) => ({ x, y: tops[0] + share * (tops[1] - tops[0]) })),
		),
	];
	const spot = spots
		.map(({ x, y }): Box => ({ x: Math.round(x), y: Math.round(y), width, height }))
		.find((one) => {
			const stand = {
				x: one.x - air,
				y: one.y - air,
				width: width + 2 * air,
				height: height + 2 * air,
			};
			if (others.some((other) => meets(other, stand))) return false;
			if (texts.some((text) => overlaps(text, asText(stand)))) return false;
			return isFree(grid, stand);
		});
	return spot ?? null;
}

const meets = (a: Box, b: Box) =>
	a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

/** A box as a text that fills it, to ask whether a name lies there. */
const asText = ({ x, y, width, height }: Box): DrawnText => ({
	...{ layer: 'collar', text: '', face: 'sans', hex: '#000000' },
	...{ x, y: y + height, width, size: height },
});

/** A slim needle, its western half black, under the letter. */
function drawn({ x, y, width, height }: Box, scale: number) {
	const size = Math.round(318 * scale);
	const tip = y + Math.round(size * 1.15);
	const [middle, foot, notch] = [x + width / 2, y + height, y + height * 0.86];
	const stroke = Math.max(6, Math.round(10 * scale));
	const half = (side: number, fill: string): DrawnShape => ({
		layer: 'north',
		points: Int32Array.from(
			[middle, tip, middle + (side * width) / 2.6, foot, middle, notch].map(Math.round),
		),
		starts: Uint32Array.of(0, 3),
		...{ closed: true, fill, stroke: '#000000', strokeWidth: stroke },
	});
	const letter = Math.ceil(textWidth('serif-bold', size, 'N'));
	const texts: DrawnText[] = [
		{
			...{ layer: 'collar', text: 'N', size, width: letter, face: 'serif-bold', hex: '#000000' },
			...{ x: Math.round(middle - letter / 2), y: y + Math.round(size * 0.8) },
		},
	];
	return { shapes: [half(-1, '#000000'), half(1, '#ffffff')], texts };
}
