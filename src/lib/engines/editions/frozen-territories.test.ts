import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { freezeTerritories, thawTerritories } from './frozen-territories.ts';

const territories = [
	{ key: 'n', name: 'North' },
	{ key: 's', name: '=South' },
	{ key: 'e', name: 'East' },
];

describe('territories of an edition', () => {
	it('name the territory of every region, and none that has no region', () => {
		const assignment = { a: 'n', b: 's', gone: 'e', c: 'lost' };
		const frozen = freezeTerritories(['a', 'b', 'c', 'd'], { territories, assignment });
		expect(frozen).toEqual({
			names: { n: 'North', s: '=South' },
			regions: { a: 'n', b: 's' },
		});
		expect(thawTerritories(['d', 'b', 'a'], frozen!)).toEqual([
			null,
			{ key: 's', name: '=South' },
			{ key: 'n', name: 'North' },
		]);
	});

	it('are none where no region of the sheet is in one', () => {
		expect(freezeTerritories(['a'], { territories, assignment: {} })).toBeNull();
		expect(freezeTerritories(['a'], { territories: [], assignment: { a: 'n' } })).toBeNull();
	});

	it('come back as they were whatever the keys are, after they were stored', () => {
		const key = fc.oneof(fc.constantFrom('__proto__', 'constructor', 'toString'), fc.string());
		fc.assert(
			fc.property(fc.uniqueArray(key, { maxLength: 20 }), fc.array(fc.nat(3)), (keys, which) => {
				const of = keys.map((_, i) => territories[which[i] ?? 3] ?? null);
				const assignment = Object.fromEntries(
					keys.flatMap((one, i) => (of[i] ? [[one, of[i].key]] : [])),
				);
				const frozen = freezeTerritories(keys, { territories, assignment });
				const stored = JSON.parse(JSON.stringify(frozen)) as typeof frozen;
				const back = stored ? thawTerritories(keys, stored) : keys.map(() => null);
				expect(back).toEqual(of);
			}),
		);
	});
});
