import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dirtyMaps } from '../../../../tests/support/dirty-maps.ts';
import {
	acceptedFeatures,
	box,
	pairsOf,
	region,
} from '../../../../tests/support/read-boundaries.ts';

async function unmatched(map: Parameters<typeof acceptedFeatures>[0]) {
	const { findings } = await acceptedFeatures(map);
	return findings.filter(({ code }) => code === 'unmatched-borders');
}

describe('borders that run apart', () => {
	it('are told with the tolerance that joins them: less does not, that does', () =>
		fc.assert(
			fc.asyncProperty(
				fc.double({ min: 1, max: 45, noNaN: true }),
				fc.integer({ min: 1, max: 12 }),
				fc.double({ min: -60, max: 60, noNaN: true }),
				async (metres, corners, lat) => {
					const width = metres / 111_320 / Math.cos((lat * Math.PI) / 180);
					const edge = Array.from({ length: corners + 2 }, (_, i) => i / (corners + 1));
					const w = region('w', [[0, lat], ...edge.map((y) => [1, lat + y]), [0, lat + 1]]);
					const e = region('e', [
						[2, lat + 1],
						...edge.map((y) => [1 + width, lat + 0.9 * y]).toReversed(),
						[2, lat],
					]);
					const [finding, ...more] = await unmatched([w, e]);
					expect(more).toEqual([]);
					expect(finding.regions.toSorted()).toEqual(['e', 'w']);
					const within = finding.toleranceMetres as number;
					expect(within).toBeGreaterThanOrEqual(metres * 0.98);
					expect(within).toBeLessThan(metres * 1.06 + 1);
					expect(finding.message).toContain(`a tolerance of ${within} m would join it: e and w.`);
					const pairs = async (toleranceMetres: number) =>
						pairsOf(await acceptedFeatures([w, e], { toleranceMetres }));
					expect(await pairs(within)).toEqual(['e-w line']);
					expect(await pairs(metres * 0.9)).toEqual([]);
				},
			),
			{ numRuns: 15 },
		));
	it('a sliver is told with the tolerance that closes it', async () => {
		const { map } = dirtyMaps['a sliver between two'];
		const [finding] = await unmatched(map);
		// the notch is 0.0003 degrees deep, 33 m
		expect(finding.message).toMatch(/up to 33 m apart.*tolerance of 34 m/);
		const toleranceMetres = finding.toleranceMetres;
		const { findings } = await acceptedFeatures(map, { toleranceMetres });
		expect(findings.filter(({ code }) => /sliver|unmatched/.test(code))).toEqual([]);
	});
	it('gaps of different scales are told apart', async () => {
		const map = [
			box('a', 0, 0, 1, 1),
			box('b', 1.00002, 0, 2, 1),
			box('c', 2.00003, 0, 3, 1),
			box('d', 3.0004, 0, 4, 1),
		];
		const findings = await unmatched(map);
		expect(findings.map(({ message }) => message)).toEqual([
			'The borders of 2 pairs run up to 3.3 m apart without meeting; a tolerance of 4 m would join them: a and b; b and c.',
			'The borders of one pair run up to 45 m apart without meeting; a tolerance of 45 m would join it: c and d.',
		]);
	});
	it('nothing is said of clean maps, of corners near each other, or of coasts that meet', async () => {
		const corner = [box('a', 0, 0, 1, 1), box('b', 1.0001, 1.0001, 2, 2)];
		const bay = [
			region('a', [[0, 0], [1, 0], [1, 0.5], [0.999, 0.5], [0.99, 1], [0, 1]]), // prettier-ignore
			region('b', [[1, 0], [2, 0], [2, 1], [1.01, 1], [1.0001, 0.5], [1, 0.5]]), // prettier-ignore
		];
		for (const map of [corner, bay, [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)]]) {
			expect(await unmatched(map)).toEqual([]);
		}
	});
});
