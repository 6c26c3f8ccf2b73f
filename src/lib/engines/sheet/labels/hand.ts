import { hundredths } from '../paper.ts';
import type { PlacedName } from '../layout/lettering.ts';
import type { Box } from '../plane/fit.ts';
import { boxAround, cellsAlong, isBorder, type Ground } from './ground.ts';
import type { Leader } from './leader.ts';
import { cellsOf, paper } from './region-raster.ts';
import type { SetName } from './set-name.ts';
import type { TextBox } from './text-box.ts';

/** A name set by hand farther from its region than this, in parts of the type size, gets a leader. */
const farFrom = 0.9;
/** Between a name and its leader. */
const clear = 0.3;

/**
 * A name where somebody put it: its middle so far from the anchor, but never off the paper. What it
 * stands on decides its ground; a leader runs to it when it stands off its region.
 */
export function setByHand(
	ground: Ground,
	region: number,
	anchor: { x: number; y: number },
	place: PlacedName,
	box: TextBox,
	paperBox: Box,
): SetName {
	const within = (at: number, half: number, low: number, size: number) =>
		Math.min(Math.max(at, low + half), Math.max(low + half, low + size - half));
	const x = within(anchor.x + hundredths(place.dxMm), box.width / 2, paperBox.x, paperBox.width);
	const y = within(anchor.y + hundredths(place.dyMm), box.height / 2, paperBox.y, paperBox.height);
	const around = boxAround(x, y, box.width, box.height);
	const on = groundUnder(ground, around, region);
	const leader =
		on === 'fill' || on === 'edge' ? null : leaderTo(ground, region, anchor, around, box);
	return { region, how: 'hand', short: place.short, box, x, y, ground: on, leader };
}

/** Whether a box stands on its region, partly on it, on empty paper or on others. */
function groundUnder({ raster }: Ground, box: Box, region: number): SetName['ground'] {
	const [left, right, top, bottom] = cellsOf(raster, box);
	let [own, others, empty] = [0, 0, 0];
	for (let row = top; row <= bottom; row++) {
		for (let column = left; column <= right; column++) {
			const inGrid = row >= 0 && column >= 0 && row < raster.rows && column < raster.columns;
			const owner = inGrid ? raster.owner[row * raster.columns + column] : paper;
			if (owner === region) own++;
			else if (owner === paper) empty++;
			else others++;
		}
	}
	if (own && !others && !empty) return 'fill';
	if (own > (others + empty) * 0.8) return 'edge';
	return others || own ? 'others' : 'paper';
}

/** From the anchor to the nearest place of the box; null where the box all but touches the region. */
function leaderTo(
	{ raster }: Ground,
	region: number,
	anchor: { x: number; y: number },
	box: Box,
	{ size }: TextBox,
): Leader | null {
	const gap = size * clear;
	const nearest = (at: number, low: number, length: number) =>
		Math.round(Math.min(Math.max(at, low - gap), low + length + gap));
	const to = { x: nearest(anchor.x, box.x, box.width), y: nearest(anchor.y, box.y, box.height) };
	const line = { from: { x: Math.round(anchor.x), y: Math.round(anchor.y) }, to };
	let off = 0;
	for (const cell of cellsAlong(raster, line)) {
		const owner = cell < 0 ? paper : raster.owner[cell];
		off = owner === region || isBorder(owner) ? 0 : off + raster.cell / 2;
	}
	return off > size * farFrom ? line : null;
}
