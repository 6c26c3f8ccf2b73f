import { describe, expect, it } from 'vitest';
import { bordersForSheet, crossedBorders, type BorderList } from '../engines/borders/index.ts';
import { Flatness, knownPlanar } from './flatness.svelte';
import { crossedSentence, loneLinks } from './planarity-words';

const keys = ['a', 'b', 'c', 'd', 'e'];
const nameOf = (region: number) => keys[region].toUpperCase();
const pairs = keys.flatMap((_, a) => keys.slice(a + 1).map((_, i) => [a, a + 1 + i]));
/** Five regions, all joined but d and e: planar, and with those two it is not (Kuratowski 1930). */
const borders: BorderList = {
	a: Uint32Array.from(pairs.slice(0, -1), ([a]) => a),
	b: Uint32Array.from(pairs.slice(0, -1), ([, b]) => b),
	kind: new Uint8Array(9),
	metres: new Float64Array(9).fill(100),
	at: new Float64Array(18),
};
const rules = { pointTouches: false, leastMetres: 0, waterKm: null, struck: [], added: [] };
const set = { planar: true } as Parameters<typeof knownPlanar>[0]['set'];

describe('whether the borders that count are planar', () => {
	it('is known where only lines of a planar map count', () => {
		const struck = [{ a: 'a', b: 'b' }];
		const counted = bordersForSheet(keys, borders, { ...rules, struck });
		expect(knownPlanar({ set, borders, counted })).toBe(true);
		expect(knownPlanar({ set: { ...set, planar: false }, borders, counted })).toBeNull();
		expect(knownPlanar({ set: { ...set, planar: false }, borders, counted: borders })).toBe(false);
	});

	it('is looked up once a border is added, and told by the regions and the border it rests on', () => {
		const counted = bordersForSheet(keys, borders, { ...rules, added: [{ a: 'e', b: 'd' }] });
		expect(knownPlanar({ set, borders, counted })).toBeNull();
		const crossed = crossedBorders(5, counted)!;
		expect([...crossed.hubs].sort()).toEqual([0, 1, 2, 3, 4]);
		expect(loneLinks(crossed, counted)).toEqual([{ a: 3, b: 4, kind: 'hand' }]);
		const sentence = crossedSentence(crossed, counted, nameOf);
		expect(sentence).toContain('each border every other one of the five.');
		expect(sentence).toContain('It rests on D and E (added by hand).');
	});

	it('is planar again once one of them is struck out', () => {
		const added = [{ a: 'd', b: 'e' }];
		const struck = [{ a: 'b', b: 'c' }];
		expect(
			crossedBorders(5, bordersForSheet(keys, borders, { ...rules, added, struck })),
		).toBeNull();
	});

	it('is not judged twice for the same pairs, whoever signed them', () => {
		const flatness = new Flatness(true);
		let made = 0;
		flatness.work(() => ({ postMessage: () => made++, terminate() {} }) as unknown as Worker);
		const judge = (added: { a: string; b: string }[]) =>
			flatness.judge({
				set,
				borders,
				counted: bordersForSheet(keys, borders, { ...rules, added }),
			});
		judge([{ a: 'd', b: 'e' }]);
		judge([{ a: 'd', b: 'e' }]);
		expect(made).toBe(1);
		judge([]);
		expect(made).toBe(1);
		judge([{ a: 'd', b: 'e' }]);
		expect(made).toBe(2);
	});
});
