import { describe, expect, it } from 'vitest';
import { evidence } from '$lib/state/evidence';
import { Viewport } from '$lib/state/viewport.svelte';
import { Framing } from './framing';

const boxes = [
	{ left: 0.1, top: 0.1, right: 0.2, bottom: 0.15 },
	{ left: 0.2, top: 0.1, right: 0.3, bottom: 0.2 },
];
const boxOf = (region: number) => boxes[region] ?? null;
const collision = (strong = [0]) => evidence({ strong, light: [1], framed: true });
const stand = ({ x, y, scale }: Viewport) => ({ x, y, scale });

function sheet() {
	const view = new Viewport();
	view.frame(800, 600, 400, 300);
	return { view, framing: new Framing(view) };
}

describe('what a collision does to the view', () => {
	it('brings all that is pointed out into the frame, larger than before', () => {
		const { view, framing } = sheet();
		framing.follow(collision(), boxOf);
		expect(view.scale).toBeGreaterThan(2);
		const left = view.x + 0.1 * view.paperWidth * view.scale;
		const right = view.x + 0.3 * view.paperWidth * view.scale;
		expect(left).toBeGreaterThan(24);
		expect(right).toBeLessThan(800 - 24);
		expect(left + right).toBeCloseTo(800, 6);
	});

	it('goes back when nothing is pointed out, also after something else was', () => {
		const { view, framing } = sheet();
		view.zoom(2, 100, 100);
		const before = stand(view);
		framing.follow(collision(), boxOf);
		const framed = stand(view);
		framing.follow(evidence({ light: [1] }), boxOf);
		expect(stand(view)).toEqual(framed);
		framing.follow(collision(), boxOf);
		framing.follow(null, boxOf);
		expect(stand(view)).toEqual(before);
	});

	it('leaves a sheet that was moved by hand where it is', () => {
		const { view, framing } = sheet();
		const shown = collision();
		framing.follow(shown, boxOf);
		view.pan(-30, 5);
		const moved = stand(view);
		framing.follow(shown, boxOf);
		framing.follow(null, boxOf);
		expect(stand(view)).toEqual(moved);
	});

	it('goes back although the frame has become another size meanwhile', () => {
		const { view, framing } = sheet();
		view.zoom(2, 100, 100);
		const { centre } = view;
		framing.follow(collision(), boxOf);
		view.frame(500, 500, 400, 300);
		framing.follow(null, boxOf);
		expect(view.scale).toBe(2);
		expect(view.centre.x).toBeCloseTo(centre.x, 6);
		expect(view.centre.y).toBeCloseTo(centre.y, 6);
	});

	it('does not move for regions that are not on the sheet', () => {
		const { view, framing } = sheet();
		const before = stand(view);
		framing.follow(evidence({ strong: [7], framed: true }), boxOf);
		expect(stand(view)).toEqual(before);
	});
});
