import { expect, it } from 'vitest';
import { regionsInside } from './lasso';
import type { Place } from './surface';

/** A paper of 200 by 100 mm shown at 2 pixels a millimetre, its corner 10 pixels into the frame. */
const view = { x: 10, y: 10, scale: 1, paperWidth: 400, paperHeight: 200 };
const paper = { widthMm: 200, heightMm: 100 };
const anchors = [5000, 5000, 15000, 5000, 10000, 9000];
const round = (x: number, y: number): Place[] => [
	[x - 30, y - 30],
	[x + 30, y - 30],
	[x + 30, y + 30],
	[x - 30, y + 30],
];

it('finds the regions whose anchor lies inside the line, at any size and place of the sheet', () => {
	expect(regionsInside(round(110, 110), view, paper, anchors)).toEqual([0]);
	const zoomed = { ...view, scale: 2, x: -300, y: 0 };
	expect(regionsInside(round(300, 200), zoomed, paper, anchors)).toEqual([1]);
});

it('finds none in a line that has no inside, and what a bent line leaves out stays out', () => {
	expect(regionsInside(round(110, 110).slice(0, 2), view, paper, anchors)).toEqual([]);
	const bent: Place[] = [
		[0, 0],
		[420, 0],
		[420, 120],
		[210, 20],
		[0, 120],
	];
	expect(regionsInside(bent, view, paper, [10000, 5000, 1000, 2000])).toEqual([1]);
});
