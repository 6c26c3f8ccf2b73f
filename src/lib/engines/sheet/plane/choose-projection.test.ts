import { describe, expect, it } from 'vitest';
import { chooseProjection } from './choose-projection.ts';
import type { Extent } from './extent.ts';

const extent = (west: number, east: number, south: number, north: number): Extent => ({
	...{ west, east, south, north },
	cut: 180,
	crossed: false,
});
const plain = { parallels: null, centre: null };
const europe = extent(-10, 40, 35, 70);

describe('a projection of the user’s own choice', () => {
	it('takes the parallels and the centre that are set, in either order', () => {
		const frame = { parallels: [60, 40] as [number, number], centre: [15, 0] as [number, number] };
		const chosen = chooseProjection(europe, { projection: 'albers', frame });
		expect(chosen.sentence).toBe(
			'Albers equal-area conic, parallels 40° N and 60° N, centre 15° E.',
		);
		expect(chosen).toMatchObject({ refused: null, equalArea: true, cut: -165 });
	});

	it('says on the sheet where areas are not true', () => {
		for (const projection of [
			'lambert-conformal',
			'equidistant-conic',
			'equidistant-azimuthal',
			'mercator',
			'transverse-mercator',
		] as const) {
			const chosen = chooseProjection(europe, { projection, frame: plain });
			expect(chosen.sentence).toMatch(/Areas are not true on it\.$/);
			expect(chosen).toMatchObject({ refused: null, equalArea: false });
		}
	});

	it.each([
		['opposite parallels', 'albers', europe, { parallels: [-30, 30] }, /alike on both sides/],
		['a parallel at the pole', 'albers', europe, { parallels: [50, 89] }, /too near the pole/],
		['a strip', 'cylindrical-equal-area', europe, { parallels: [85, -85] }, /squeeze/],
		['Mercator at the pole', 'mercator', extent(0, 40, 60, 88), {}, /without end/],
		[
			'a cone towards the far pole',
			'lambert-conformal',
			extent(-60, 60, -88, 80),
			{ parallels: [20, 60] },
			/far pole/,
		],
		['a centre out of reach', 'lambert-azimuthal', europe, { centre: [-170, -60] }, /out of reach/],
		['a meridian out of reach', 'transverse-equal-area', europe, { centre: [120, 0] }, /reach/],
		['a narrow strip left', 'transverse-mercator', europe, { centre: [100, 0] }, /reach/],
	] as const)('refuses %s in words, and draws what suits', (_, projection, one, figures, why) => {
		const frame = { ...plain, ...figures } as typeof plain;
		const chosen = chooseProjection(one, { projection, frame });
		expect(chosen.refused).toMatch(why);
		expect(chosen.refused).toMatch(/is drawn instead\.$/);
		expect(chosen.sentence).toBe(chooseProjection(one, { projection: 'auto' }).sentence);
	});

	it('says why one was chosen', () => {
		const why = (one: Extent) => chooseProjection(one, { projection: 'auto' }).why;
		expect(why(extent(-180, 180, -60, 80))).toMatch(/round the globe/);
		expect(why(extent(-180, 180, 62, 90))).toMatch(/round a pole/);
		expect(why(extent(-76, -67, -56, -17))).toMatch(/further north and south/);
		expect(why(extent(95, 141, -11, 6))).toMatch(/along the equator/);
	});
});
