import { expect, it } from 'vitest';
import { defaultLimits } from './options.ts';
import { RawLayer } from './raw-layer.ts';
import { sketchOf } from './sketch.ts';

function layerOf(rings: [number, number][][]): RawLayer {
	const layer = new RawLayer(defaultLimits);
	for (const ring of rings) {
		layer.startRegion();
		layer.startPart();
		layer.startRing();
		for (const [x, y] of ring) layer.point(x, y);
	}
	return layer;
}

const circle = (x: number, y: number, radius: number, points: number) =>
	Array.from({ length: points + 1 }, (_, i): [number, number] => {
		const turn = (2 * Math.PI * (i % points)) / points;
		return [x + radius * Math.cos(turn), y + radius * Math.sin(turn)];
	});

const pointsOf = (lines: number[][]) => lines.reduce((sum, line) => sum + line.length / 2, 0);

it('draws large outlines by few points, closed, and leaves out what cannot be seen', () => {
	const sketch = sketchOf(layerOf([circle(0, 0, 1, 100_000), circle(5, 5, 1e-4, 50)]));
	expect(sketch?.lines).toHaveLength(1);
	expect(sketch?.leftOut).toBe(1);
	const [line] = sketch?.lines ?? [];
	expect(line.length / 2).toBeGreaterThan(50);
	expect(line.length / 2).toBeLessThanOrEqual(6000);
	expect(line.slice(0, 2)).toEqual(line.slice(-2));
	// no point of the circle lies farther from the drawing than a hundredth of the map
	for (let i = 0; i + 3 < line.length; i += 2) {
		const middle = Math.hypot((line[i] + line[i + 2]) / 2, (line[i + 1] + line[i + 3]) / 2);
		expect(Math.abs(1 - middle)).toBeLessThan(0.06);
	}
	expect(sketch?.box.map((value) => Number(value.toFixed(3)))).toEqual([-1, -1, 5, 5]);
});

it('keeps within 6,000 points whatever there is to draw', () => {
	const many = Array.from({ length: 2500 }, (_, i) => circle(i % 50, Math.floor(i / 50), 0.4, 60));
	const sketch = sketchOf(layerOf(many));
	expect(pointsOf(sketch?.lines ?? [])).toBeLessThanOrEqual(6000);
	expect(sketch?.lines.length).toBeGreaterThan(500);
});

it('draws some of the outlines where none is large enough to see', () => {
	const many = Array.from({ length: 90_000 }, (_, i) =>
		circle(i % 300, Math.floor(i / 300), 0.4, 8),
	);
	const sketch = sketchOf(layerOf(many));
	expect(sketch?.lines.length).toBeGreaterThan(500);
	expect(pointsOf(sketch?.lines ?? [])).toBeLessThanOrEqual(6000);
	expect((sketch?.lines.length ?? 0) + (sketch?.leftOut ?? 0)).toBe(90_000);
});

it('draws nothing where there is nothing', () => {
	expect(sketchOf(layerOf([]))).toBeNull();
	expect(sketchOf(layerOf([[[2, 2], [2, 2], [2, 2]]]))?.box).toEqual([2, 2, 2, 2]); // prettier-ignore
});
