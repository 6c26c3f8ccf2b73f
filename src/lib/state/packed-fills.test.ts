import { expect, it } from 'vitest';
import type { RegionFill } from '../engines/sheet/drawing.ts';
import { packFills, unpackFills } from './packed-fills.ts';

it('gives back every fill but for its rings', () => {
	const fills: RegionFill[] = [
		{ region: 0, key: 'a', name: 'Aal', ink: 2, hex: '#112233', rings: [Int32Array.of(1)] },
		{ region: 1, key: 'b', name: 'Berg', ink: -1, hex: '#f2f2f2', locked: true, rings: [] },
		{ region: 2, key: 'c', name: '', ink: 2, hex: '#112233', rings: [] },
	];
	const regions = { key: ['a', 'b', 'c'], name: ['Aal', 'Berg', ''] };
	const bare = fills.map((fill) => ({ ...fill, rings: [] }));
	expect(unpackFills(structuredClone(packFills(fills)), regions)).toEqual(bare);
});
