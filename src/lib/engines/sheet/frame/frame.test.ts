import { describe, expect, it } from 'vitest';
import {
	layout,
	sheetOf,
	statesCoverage,
	worldCoverage,
} from '../../../../../tests/support/sheets.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import { drawSheet, recolour } from '../index.ts';
import type { FrameLayout } from '../layout/frame.ts';
import { shapesIn } from '../shapes.ts';

const draw = (coverage: Coverage, frame: Partial<FrameLayout>, more = {}) =>
	drawSheet(
		sheetOf(coverage, {
			layout: { ...layout, labels: false, ...more, frame: { ...layout.frame, ...frame } },
		}),
	);

/** A square land with a square gap, in two halves that both border on the gap, and an islet in the gap. */
function landWithLake(): Coverage {
	const line = (...points: number[]) => points;
	const arcs = [
		line(1, 0, 0, 0, 0, 3, 1, 3), // west half, outside
		line(1, 3, 1, 2), // between the halves, north
		line(1, 2, 0.5, 2, 0.5, 1, 1, 1), // the lake's western shore
		line(1, 1, 1, 0), // between the halves, south
		line(1, 0, 3, 0, 3, 3, 1, 3), // east half, outside
		line(1, 1, 2, 1, 2, 2, 1, 2), // the lake's eastern shore
	];
	const starts = [0];
	arcs.forEach((arc) => starts.push(starts[starts.length - 1] + arc.length / 2));
	// west: ~0 (from 1,3 back to 1,0) reversed to run anticlockwise: ~3, ~2, ~1, ~0
	return {
		keys: ['w', 'e'],
		names: ['West', 'East'],
		arcPoints: Float64Array.from(arcs.flat()),
		arcStarts: Uint32Array.from(starts),
		arcLeft: Int32Array.of(-1, 1, -1, 1, 1, -1),
		arcRight: Int32Array.of(0, 0, 0, 0, -1, 1),
		arcMetres: new Float64Array(6).fill(1),
		ringArcs: Int32Array.of(~3, ~2, ~1, ~0, 4, 1, ~5, 3),
		ringStarts: Uint32Array.of(0, 4, 8),
		partRings: Uint32Array.of(0, 1, 2),
		regionParts: Uint32Array.of(0, 1, 2),
		areasKm2: Float64Array.of(30_000, 60_000),
		enclaveOf: Int32Array.of(-1, -1),
	};
}

describe('water', () => {
	it('tints the map’s box, or the globe on a map of the world', () => {
		const [sea] = shapesIn(draw(statesCoverage(), { sea: '#dfe9ee' }), 'sea');
		expect(sea.starts).toEqual(Uint32Array.of(0, 4));
		const [globe] = shapesIn(draw(worldCoverage(), { sea: '#dfe9ee' }), 'sea');
		expect(globe.points.length).toBeGreaterThan(300);
	});

	it('tints gaps that regions enclose together', () => {
		const drawing = draw(landWithLake(), { lakes: '#dfe9ee' });
		const [lakes] = shapesIn(drawing, 'lakes');
		expect(lakes.starts.length - 1).toBe(1);
		expect(drawing.frame.lakes).toBe(1);
	});

	it('takes no coast and no seam of the file for a lake', () => {
		expect(draw(worldCoverage(['Antarctica', 'Fiji']), { lakes: '#dfe9ee' }).frame.lakes).toBe(0);
		// Natural Earth leaves the Caspian Sea out of all countries around it
		const around = ['Kazakhstan', 'Russia', 'Azerbaijan', 'Iran', 'Turkmenistan'];
		expect(draw(worldCoverage(around), { lakes: '#dfe9ee' }).frame.lakes).toBeGreaterThan(0);
	});

	it('is seen by every reader as drawing anew would show it', () => {
		const sheet = sheetOf(statesCoverage(), {
			layout: { ...layout, labels: false, frame: { ...layout.frame, sea: '#99c8e0' } },
		});
		const drawing = drawSheet(sheet);
		for (const reader of ['grey', 'tritan'] as const) {
			const anew = drawSheet({ ...sheet, reader });
			expect(recolour(drawing, sheet.colouring, sheet.inks, reader)).toEqual(anew);
		}
	});
});

describe('the north arrow', () => {
	it('stands where north is straight up', () => {
		const drawing = draw(worldCoverage(['Luxembourg']), { northArrow: true });
		expect(drawing.frame.noArrow).toBeNull();
		expect(shapesIn(drawing, 'north').length).toBe(2);
		expect(drawing.texts.filter(({ text }) => text === 'N').length).toBe(1);
	});

	it('is refused with its reason where north turns', () => {
		const drawing = draw(statesCoverage(), { northArrow: true });
		expect(shapesIn(drawing, 'north')).toEqual([]);
		// by hand: the cone of parallels 28.5° and 45° turns by (sin 28.5° + sin 45°) / 2 = 0.592 of the longitude
		// off the centre of 96° W; Maine and Washington lie 29° off: 17°
		expect(drawing.frame.noArrow).toMatch(/north turns up to 17° away/);
	});

	it('stands on a cylinder, whose north is up everywhere', () => {
		const drawing = draw(
			statesCoverage(),
			{ northArrow: true },
			{ projection: 'cylindrical-equal-area' },
		);
		expect(drawing.frame.noArrow).toBeNull();
	});
});

describe('a map of the world', () => {
	it('can be centred elsewhere, cut where it opens, and keeps every region whole', () => {
		const world = worldCoverage();
		const drawing = draw(
			world,
			{ centre: [150, 0], sea: '#dfe9ee' },
			{ projection: 'equal-earth' },
		);
		expect(drawing.notes.projection).toBe('Equal Earth, centre 150° E.');
		const [globe] = shapesIn(drawing, 'sea');
		const xs = globe.points.filter((_, i) => i % 2 === 0);
		const width = xs.reduce((a, b) => Math.max(a, b)) - xs.reduce((a, b) => Math.min(a, b));
		// a line across the map from one rim to the other would be a region that was not cut
		for (const { rank, arcs } of drawing.lines) {
			if (rank !== 'region' && rank !== 'outer') continue;
			for (const arc of arcs) {
				for (let i = drawing.arcStarts[arc] + 1; i < drawing.arcStarts[arc + 1]; i++) {
					const step = Math.abs(drawing.arcPoints[2 * i] - drawing.arcPoints[2 * i - 2]);
					expect(step).toBeLessThan(width / 8);
				}
			}
		}
	});

	it('says what a ratio would need', () => {
		const drawing = draw(statesCoverage(), { ratio: 14_000_000 });
		expect(drawing.frame.told[0]).toMatch(/does not fit its place/);
		expect(drawing.frame.told[1]).toBe('A3 landscape would take it.');
		expect(draw(statesCoverage(), { ratio: 14_000_000 }, { paper: 'A3' }).frame.told).toEqual([]);
	});
});
