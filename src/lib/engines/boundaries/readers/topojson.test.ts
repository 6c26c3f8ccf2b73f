import { strToU8 } from 'fflate';
import { topology } from 'topojson-server';
import { describe, expect, it } from 'vitest';
import {
	accepted,
	box,
	collection,
	pairsOf,
	refusal,
} from '../../../../../tests/support/read-boundaries.ts';

const two = collection([box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)]);
const point = {
	type: 'Feature',
	properties: {},
	geometry: { type: 'Point', coordinates: [0, 0] },
} as const;
const made = (objects: Parameters<typeof topology>[0], steps?: number) =>
	JSON.parse(JSON.stringify(topology(objects, steps)));
const bytes = (value: unknown) => strToU8(JSON.stringify(value));

describe('layers', () => {
	it('are asked for where several hold areas', async () => {
		const several = bytes(made({ wards: two, regions: two, stops: point }));
		const { code, question } = await refusal(several);
		expect(code).toBe('layer-needed');
		expect(question?.choices.map(({ value, words }) => [value, words])).toEqual([
			['wards', '2 features with areas.'],
			['regions', '2 features with areas.'],
		]);
		expect(question?.choices[0].sketch?.lines).toHaveLength(2);
		const read = await accepted(several, question?.choices[1].options);
		expect(read.found.layers.map(({ name, areas }) => [name, areas])).toEqual([
			['wards', true],
			['regions', true],
			['stops', false],
		]);
	});

	it('the only one with areas is read', async () => {
		const { source } = await accepted(bytes(made({ wards: two, stops: point })));
		expect(source.layer).toBe('wards');
	});
});

describe('arcs', () => {
	it('in steps are read, and their sums held to be numbers', async () => {
		const quantised = made({ wards: two }, 1e4);
		expect(pairsOf(await accepted(bytes(quantised)))).toEqual(['a-b line']);
		quantised.arcs[0][0][0] = 1e308;
		quantised.arcs[0][1][0] = 1e308;
		expect((await refusal(bytes(quantised))).code).toBe('bad-arc');
	});

	it('whose transform makes points of them are refused', async () => {
		const flat = made({ wards: two }, 1e4);
		flat.transform.scale[0] = 0;
		expect((await refusal(bytes(flat))).code).toBe('bad-coordinate');
	});

	it('used so often that they would fill the memory are refused before they are written out', async () => {
		const ring = Array.from({ length: 5000 }, (_, i) => [Math.cos(i), Math.sin(i)]);
		const arcs = [[...ring, ring[0]]];
		const geometry = { type: 'Polygon', arcs: [new Array(20_000).fill(0)] };
		const wards = { type: 'GeometryCollection', geometries: [geometry] };
		const { code } = await refusal(bytes({ type: 'Topology', arcs, objects: { wards } }));
		expect(code).toBe('too-large-unpacked');
	});
});
