import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitMap, ratioOf, type PlaneBox } from './fit-map.ts';
import { lambertAzimuthal } from './projections.ts';

const { projection } = lambertAzimuthal(50, 10);
/** About 640 by 380 km round 50° N 10° E. */
const bounds: PlaneBox = { left: -0.05, right: 0.05, top: -0.03, bottom: 0.03 };
const box = { x: 1000, y: 2000, width: 20_000, height: 12_000 };
const plain = { ratio: null, shiftMm: [0, 0] as [number, number] };

describe('the map in its box', () => {
	it('is as large as fits unless a ratio is given', () => {
		const { fit, ratio, told } = fitMap(bounds, projection, box, plain);
		expect(fit.scale * 0.1).toBeCloseTo(box.width, 6);
		// 0.1 radii of a sphere of 6,371 km on 200 mm; the ellipsoid differs by less than 0.4 %
		expect(Math.abs(ratio! / 3_185_500 - 1)).toBeLessThan(0.004);
		expect(told).toEqual([]);
	});

	it('is drawn at the ratio that is given, measured on the ellipsoid', () => {
		const { fit, ratio } = fitMap(bounds, projection, box, { ...plain, ratio: 5_000_000 });
		expect(ratio).toBe(5_000_000);
		expect(Math.abs(ratioOf(projection, bounds, fit)! / 5_000_000 - 1)).toBeLessThan(1e-4);
	});

	it('tells by how much a ratio does not fit', () => {
		const found = fitMap(bounds, projection, box, { ...plain, ratio: 2_000_000 });
		expect(found.told[0]).toMatch(
			/^At 1 : 2,000,000 the map does not fit its place: \d+ mm too wide/,
		);
		expect(found.tooLarge!.widthMm).toBeGreaterThan(300);
		expect(found.fit.scale * 0.1).toBeCloseTo(box.width, 6);
	});

	it('never leaves its box, whatever is asked', () => {
		const shift = fc.double({ min: -500, max: 500, noNaN: true });
		const ratio = fc.option(fc.double({ min: 100, max: 1e9, noNaN: true }));
		fc.assert(
			fc.property(ratio, shift, shift, (asked, right, down) => {
				const wish = { ratio: asked, shiftMm: [right, down] as [number, number] };
				const { scale, dx, dy } = fitMap(bounds, projection, box, wish).fit;
				expect(bounds.left * scale + dx).toBeGreaterThan(box.x - 1e-6);
				expect(bounds.right * scale + dx).toBeLessThan(box.x + box.width + 1e-6);
				expect(bounds.top * scale + dy).toBeGreaterThan(box.y - 1e-6);
				expect(bounds.bottom * scale + dy).toBeLessThan(box.y + box.height + 1e-6);
			}),
		);
	});
});
