import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { unionAndSum } from '../../../../../tests/support/geos-areas.ts';
import { acceptedFeatures, pairsOf } from '../../../../../tests/support/read-boundaries.ts';
import { defects, featuresOf, shakenLand } from '../../../../../tests/support/spoilt-land.ts';
import { coverageFaults, coverageToGeoJson } from '../index.ts';

const lands = fc.record({
	size: fc.constant(6),
	shakes: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 98, maxLength: 98 }),
	spoilt: fc.uniqueArray(fc.constantFrom(...Object.keys(defects)), { minLength: 1, maxLength: 4 }),
	columns: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 4, maxLength: 4 }),
});

describe('any land, spoilt in any ways and mended by what is usually offered', () => {
	it('has the neighbours of the clean land, no fault left and no land counted twice', () =>
		fc.assert(
			fc.asyncProperty(lands, async ({ size, shakes, spoilt, columns }) => {
				const clean = await acceptedFeatures(featuresOf(shakenLand(size, shakes)));
				const land = shakenLand(size, shakes);
				spoilt.forEach((name, i) => defects[name](land, columns[i]));
				const dirty = await acceptedFeatures(featuresOf(land));
				const found = dirty.findings.filter(({ offers }) => offers);
				expect(found).toHaveLength(spoilt.filter((name) => name !== 'noise').length);
				const mends = found.flatMap(({ offers }) =>
					(offers ?? []).filter(({ usual }) => usual).map(({ mend }) => mend),
				);
				const mended = await acceptedFeatures(featuresOf(land), { mends });
				expect(coverageFaults(mended.coverage)).toEqual([]);
				expect(mended.findings.filter(({ offers }) => offers)).toEqual([]);
				const told = mended.findings.filter(({ code }) => code === 'mended');
				expect(told).toHaveLength(mends.length);
				expect(pairsOf(mended)).toEqual(pairsOf(clean));
				const { features } = coverageToGeoJson(mended.coverage);
				const { union, sum } = await unionAndSum(features);
				expect(sum).toBeCloseTo(union, 9);
			}),
			{ numRuns: 40 },
		));
});
