import { describe, expect, it } from 'vitest';
import { readBoundaries, sourceOf } from '$lib/engines/boundaries';
import { boxOf, closer, drawSide, frameOf, placeIn, sideOf, widthMetres } from './side-drawing';

const square = (key: string, west: number) => ({
	type: 'Feature',
	properties: { key },
	geometry: {
		type: 'Polygon',
		coordinates: [
			[
				[west, 0],
				[west + 1, 0],
				[west + 1, 1],
				[west, 1],
				[west, 0],
			],
		],
	},
});

async function twoSquares() {
	const text = JSON.stringify({
		type: 'FeatureCollection',
		features: [square('w', 10), square('e', 11)],
	});
	const read = await readBoundaries(sourceOf('two.geojson', new TextEncoder().encode(text)), {
		keyField: 'key',
	});
	if (read.status !== 'accepted') throw new Error('two squares are a coverage');
	return sideOf(read.coverage);
}

describe('drawing one side of a change', () => {
	it('lays every region into one frame, the marked and the chosen ones once more', async () => {
		const side = await twoSquares();
		expect(side.box).toEqual([10, 0, 12, 1]);
		expect(boxOf(side, ['e', 'nobody'])).toEqual([11, 0, 12, 1]);
		expect(boxOf(side, ['nobody'])).toBeNull();
		const frame = frameOf(side.box, 0.1);
		const { land, marked, chosen } = drawSide(side, frame, ['e'], []);
		expect(land.match(/M/g)).toHaveLength(2);
		expect(marked.match(/M/g)).toHaveLength(1);
		expect(chosen).toBe('');
		const numbers = (marked.match(/[\d.]+/g) ?? []).map(Number);
		expect(Math.max(...numbers)).toBeLessThanOrEqual(frame.width);
		// the east square lies in the right half of the frame
		expect(placeIn(frame, [11, 0.5])).toEqual({ x: 500, y: frame.height / 2 });
	});

	it('steps closer round a place', async () => {
		const side = await twoSquares();
		const frame = frameOf(side.box, 0);
		expect(widthMetres(frame)).toBeCloseTo(2 * 111_195 * Math.cos(Math.PI / 360), 0);
		const near = closer(frame, [11, 0.5], 2);
		expect(widthMetres(near)).toBeCloseTo(widthMetres(frame) / 16, 0);
		expect(placeIn(near, [11, 0.5])).toEqual({ x: 500, y: frame.height / 2 });
	});

	it('leaves out what lies outside a frame drawn closer', async () => {
		const side = await twoSquares();
		const { land } = drawSide(side, frameOf([10, 0, 10.5, 0.5], 0), [], []);
		expect(land.match(/M/g)).toHaveLength(1);
	});
});
