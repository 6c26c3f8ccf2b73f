import { describe, expect, it } from 'vitest';
import { topologyOf } from '../../../../../tests/support/atlas.ts';
import { coverageFrom } from '../../../../../tests/support/coverage.ts';
import { layout, sheetOf, worldCoverage } from '../../../../../tests/support/sheets.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import type { Drawing } from '../drawing.ts';
import {
	drawPlaced,
	drawSheet,
	groundOf,
	refineGround,
	regionAt,
	regionSizesMm,
} from '../index.ts';
import { ringDoubleArea, ringPoints } from '../fills.ts';
import type { SheetLayout } from '../layout.ts';
import { clustersOf } from './clusters.ts';

const withInsets = (
	frame: Partial<SheetLayout['frame']> = {},
	more: Partial<SheetLayout> = {},
) => ({
	...layout,
	labels: false,
	...more,
	frame: { ...layout.frame, insets: 'auto' as const, ...frame },
});

const territories = ['60', '66', '69', '72', '78'];
const us = coverageFrom(topologyOf('us-atlas', 'states-10m.json'), 'states', {
	keep: (_, id) => !territories.includes(id),
});
const region = (coverage: Coverage, name: string) => coverage.names.indexOf(name);

interface Box {
	left: number;
	top: number;
	right: number;
	bottom: number;
}
const boxOf = (points: ArrayLike<number>): Box => {
	const all = Array.from(points);
	const [xs, ys] = [all.filter((_, i) => i % 2 === 0), all.filter((_, i) => i % 2 === 1)];
	return {
		left: Math.min(...xs),
		top: Math.min(...ys),
		right: Math.max(...xs),
		bottom: Math.max(...ys),
	};
};
const insetBoxes = ({ shapes }: Drawing) =>
	shapes.filter(({ layer }) => layer === 'inset').map(({ points }) => boxOf(points));
const apart = (a: Box, b: Box) =>
	a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
const inside = (a: Box, b: Box) =>
	a.left >= b.left && a.right <= b.right && a.top >= b.top && a.bottom <= b.bottom;

/** Whether a ring neither has a point in a box nor holds its corner. */
function clear(points: number[], { left, top, right, bottom }: Box): boolean {
	let around = false;
	for (let i = 0, j = points.length - 2; i < points.length; j = i, i += 2) {
		const [x, y, x0, y0] = [points[i], points[i + 1], points[j], points[j + 1]];
		if (x > left && x < right && y > top && y < bottom) return false;
		if (y > top !== y0 > top && left < ((x0 - x) * (top - y)) / (y0 - y) + x) around = !around;
	}
	return !around;
}

/** Every ring lies in one inset, or clear of all of them; insets lie clear of each other. */
function expectInOrder(drawing: Drawing): void {
	const boxes = insetBoxes(drawing);
	boxes.forEach((box, i) =>
		boxes.slice(i + 1).forEach((other) => expect(apart(box, other)).toBe(true)),
	);
	const paper = { left: 0, top: 0, right: drawing.widthMm * 100, bottom: drawing.heightMm * 100 };
	boxes.forEach((box) => expect(inside(box, paper)).toBe(true));
	for (const { rings } of drawing.fills) {
		for (const ring of rings) {
			const points = ringPoints(drawing, ring);
			const own = boxOf(points);
			const holds = boxes.filter((box) => inside(own, box));
			expect(holds.length).toBeLessThan(2);
			for (const box of boxes)
				expect(holds.includes(box) || apart(own, box) || clear(points, box)).toBe(true);
		}
	}
	const texts = drawing.texts.filter(({ layer }) => layer === 'title' || layer === 'legend');
	for (const { x, y, width, size } of texts) {
		const text = { left: x, top: y - 0.7 * size, right: x + width, bottom: y };
		for (const box of boxes) expect(apart(box, text)).toBe(true);
	}
}

describe('parts that lie together', () => {
	it('are the mainland, Alaska and Hawaii of the fifty states', () => {
		const [main, alaska, hawaii] = clustersOf(us);
		expect(main.regions.length).toBe(49);
		expect(us.names[alaska.regions[0].region]).toBe('Alaska');
		expect(us.names[hawaii.regions[0].region]).toBe('Hawaii');
		// U.S. Census Bureau, State Area Measurements 2010: land and water of Hawaii 28,313 km², land 16,635
		expect(Math.abs(hawaii.areaKm2 / 16_635 - 1)).toBeLessThan(0.03);
	});

	it('join across the meridian of 180 degrees, and hold every part once', () => {
		const fiji = worldCoverage(['Fiji', 'New Zealand', 'Russia']);
		const clusters = clustersOf(fiji);
		const parts = clusters.flatMap((cluster) => cluster.parts);
		expect(new Set(parts).size).toBe(parts.length);
		expect(parts.length).toBe(fiji.partRings.length - 1);
		const russia = clusters.filter(({ regions }) => regions[0].region === region(fiji, 'Russia'));
		// Natural Earth's Russia is two parts at 180 degrees; its mainland is one group with Chukotka
		expect(russia[0].areaKm2).toBeGreaterThan(16_000_000);
	});
});

describe('insets', () => {
	const drawing = drawSheet(sheetOf(us, { layout: withInsets() }));

	it('hold Alaska and Hawaii, told with their scale, and nothing overlaps', () => {
		expect(insetBoxes(drawing).length).toBe(2);
		expectInOrder(drawing);
		const words = drawing.texts.map(({ text }) => text);
		expect(words).toContain('Alaska');
		expect(drawing.notes.insets).toMatch(
			/^In boxes of their own: Alaska, 1 : [\d,]+; Hawaii, 1 : /,
		);
		expect(drawing.fills.every(({ rings }) => rings.length > 0)).toBe(true);
	});

	it.each(['A5', 'A3', 'A1'] as const)('stay in order on %s, lying and standing', (paper) => {
		for (const orientation of ['landscape', 'portrait'] as const) {
			const one = drawSheet(sheetOf(us, { layout: withInsets({}, { paper, orientation }) }));
			expectInOrder(one);
			expect(insetBoxes(one).length).toBe(2);
		}
	});

	it('make the rest of the map larger', () => {
		const whole = regionSizesMm(us, { ...layout, labels: false });
		const parted = regionSizesMm(us, withInsets());
		const [texas, alaska] = [region(us, 'Texas'), region(us, 'Alaska')];
		expect(parted[texas]).toBeGreaterThan(1.3 * whole[texas]);
		// sizes are those on the paper: Alaska's in its box
		const box = insetBoxes(drawing).find((one) => {
			const points = ringPoints(drawing, drawing.fills[alaska].rings[0]);
			return inside(boxOf(points), one);
		})!;
		expect(parted[alaska]).toBeLessThan((box.bottom - box.top) / 100);
	});

	it('keep areas true to one another within each frame', () => {
		const flat = (name: string) => {
			const { rings } = drawing.fills[region(us, name)];
			return Math.abs(
				rings.reduce((sum, ring) => sum + ringDoubleArea(ringPoints(drawing, ring)), 0),
			);
		};
		const share = (name: string) => flat(name) / us.areasKm2[region(us, name)];
		for (const name of ['Texas', 'Maine', 'Florida', 'Washington'])
			expect(Math.abs(share(name) / share('Kansas') - 1)).toBeLessThan(0.02);
	});

	it('can be pointed at, and refined with finer lines on their own projection', () => {
		const { drawing: drawn, placement } = drawPlaced(sheetOf(us, { layout: withInsets() }));
		const ground = groundOf(drawn);
		const everywhere = { left: 0, top: 0, right: 1e5, bottom: 1e5 };
		expect(refineGround(ground, us, placement, everywhere)).toEqual(ground);
		const hawaii = region(us, 'Hawaii');
		const ring = drawn.fills[hawaii].rings.at(-1)!;
		const { left, top, right, bottom } = boxOf(ringPoints(drawn, ring));
		expect(regionAt(ground, (left + right) / 2, (top + bottom) / 2)).toBe(hawaii);
	});

	const alaska = clustersOf(us)[1].id;
	const choose = (choice: object) =>
		drawSheet(
			sheetOf(us, {
				layout: withInsets({
					insetChoices: {
						[alaska]: { place: null, cornerMm: null, ratio: null, name: null, ...choice },
					},
				}),
			}),
		);

	it('stand where they are put, at the scale that is set, under the name that is given', () => {
		const one = choose({ cornerMm: [13, 135], ratio: 90_000_000, name: 'The north' });
		const found = one.frame.clusters.find(({ id }) => id === alaska)!;
		expect(found).toMatchObject({ place: 'box', ratio: 90_000_000, cornerMm: [13, 135] });
		expect(one.texts.map(({ text }) => text)).toContain('The north');
		expectInOrder(one);
	});

	it('are put elsewhere if they would lie over the map, and that is told', () => {
		const one = choose({ cornerMm: [140, 80] });
		expect(one.frame.told.join()).toMatch(/The box of Alaska would lie over the map/);
		expectInOrder(one);
	});

	it('can be left out, and the sheet says so', () => {
		const one = choose({ place: 'out' });
		expect(one.fills[region(us, 'Alaska')].rings).toEqual([]);
		const said = one.texts.map(({ text }) => text).join(' ');
		expect(said).toMatch(/Not on this sheet: Alaska/);
	});

	it('can be brought back into the frame', () => {
		const one = choose({ place: 'frame' });
		expect(insetBoxes(one).length).toBe(1);
		expectInOrder(one);
	});

	it('are not made for a map of the world', () => {
		const one = drawSheet(sheetOf(worldCoverage(), { layout: withInsets() }));
		expect(insetBoxes(one)).toEqual([]);
		expect(one.frame.clusters.every(({ place }) => place === 'frame')).toBe(true);
	});

	it('are asked about where they would hold specks', () => {
		const norway = drawSheet(sheetOf(worldCoverage(['Norway']), { layout: withInsets() }));
		const out = norway.frame.clusters.filter(({ place }) => place === 'out');
		expect(out.length).toBeGreaterThan(0);
		expect(out.every(({ speck }) => speck)).toBe(true);
		const said = norway.texts.map(({ text }) => text).join(' ');
		expect(said).toMatch(/Not on this sheet: part of Norway/);
		expectInOrder(norway);
	});
});
