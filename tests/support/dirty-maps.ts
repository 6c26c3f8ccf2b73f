/** Small maps with one fault each, by construction; degrees near the equator, where 0.001 is about 111 m. */
import type { Feature, MultiPolygon, Polygon } from 'geojson';
import { box, region } from './read-boundaries.ts';

type Map_ = Feature<Polygon | MultiPolygon>[];

/** A notch in the east region, so deep in degrees, closed above and below. */
const notched = (deep: number): Map_ => [
	box('w', 0, 0, 1, 1),
	region('e', [
		[1, 0],
		[2, 0],
		[2, 1],
		[1, 1],
		[1, 0.6],
		[1 + deep, 0.5],
		[1, 0.4],
	]),
];

export const multi = (id: string, ...parts: number[][][][]): Feature<MultiPolygon> => ({
	type: 'Feature',
	id,
	properties: {},
	geometry: {
		type: 'MultiPolygon',
		coordinates: parts.map((rings) => rings.map((ring) => [...ring, ring[0]])),
	},
});

export const square = (west: number, south: number, east: number, north: number) => [
	[west, south],
	[east, south],
	[east, north],
	[west, north],
];

/** Each with the code of the finding it must give. */
export const dirtyMaps: Record<string, { code: string; map: Map_ }> = {
	'a sliver between two': { code: 'sliver', map: notched(0.0003) },
	'a gap between two': { code: 'gap', map: notched(0.0015) },
	'a gap between four': {
		code: 'gap',
		map: [
			box('s', 0, 0, 0.03, 0.01),
			box('n', 0, 0.02, 0.03, 0.03),
			box('w', 0, 0.01, 0.01, 0.02),
			box('e', 0.015, 0.01, 0.03, 0.02),
		],
	},
	'a gap with an island in it': {
		code: 'gap',
		map: [
			region('ring', [
				[0, 0],
				[0.03, 0],
				[0.03, 0.015],
				[0.02, 0.015],
				[0.02, 0.01],
				[0.01, 0.01],
				[0.01, 0.015],
				[0, 0.015],
			]),
			region('lid', [
				[0, 0.015],
				[0.01, 0.015],
				[0.01, 0.02],
				[0.02, 0.02],
				[0.02, 0.015],
				[0.03, 0.015],
				[0.03, 0.03],
				[0, 0.03],
			]),
			box('island', 0.013, 0.013, 0.017, 0.017),
		],
	},
	'two that overlap in part': {
		code: 'overlap',
		map: [box('w', 0, 0, 1, 1), box('e', 0.9, 0.2, 2, 0.8), box('n', 0, 1, 1, 2)],
	},
	'two that overlap across slanted lines': {
		code: 'overlap',
		map: [
			region('w', [
				[0, 0],
				[1.013, 0.07],
				[0.951, 1.02],
				[0, 1],
			]),
			region('e', [
				[0.977, 0.11],
				[2, 0],
				[2, 1],
				[1.003, 0.93],
			]),
		],
	},
	'one inside another without a hole': {
		code: 'overlap',
		map: [box('big', 0, 0, 3, 3), box('small', 1, 1, 2, 2)],
	},
	'one that pokes over a shared line': {
		code: 'overlap',
		map: [
			box('w', 0, 0, 1, 1),
			region('e', [
				[1, 0],
				[2, 0],
				[2, 1],
				[1, 1],
				[1, 0.8],
				[0.8, 0.8],
				[0.8, 0.6],
				[1, 0.6],
			]),
		],
	},
	'the same outline twice': {
		code: 'duplicate-region',
		map: [box('a', 0, 0, 1, 1), box('b', 0, 0, 1, 1), box('c', 1, 0, 2, 1)],
	},
	'an outline that crosses itself': {
		code: 'self-crossing',
		map: [
			region('bow', [
				[0, 0],
				[2, 2],
				[2, 0],
				[0, 1],
			]),
			box('e', 2, 0, 3, 2),
		],
	},
	'an outline that crosses itself in a corner': {
		code: 'self-crossing',
		map: [
			region('bow', [
				[0, 0],
				[1, 1],
				[3, 3],
				[3, 0],
				[1, 1],
				[0, 1.5],
			]),
			box('e', 3, 0, 4, 3),
		],
	},
	'parts of one region that overlap': {
		code: 'self-crossing',
		map: [multi('m', [square(0, 0, 1, 1)], [square(0.5, 0.5, 2, 2)]), box('e', 2, 0.5, 3, 2)],
	},
	'a part inside another part of its region': {
		code: 'parts-overlap',
		map: [multi('m', [square(0, 0, 1, 1)], [square(0.2, 0.2, 0.5, 0.4)]), box('e', 1, 0, 2, 1)],
	},
	'a part along the edge of another part of its region': {
		code: 'parts-overlap',
		map: [multi('m', [square(0, 0, 1, 1)], [square(0.5, 0.2, 1, 0.4)]), box('e', 1, 0, 2, 1)],
	},
	'a part written twice': {
		code: 'parts-overlap',
		map: [multi('m', [square(0, 0, 1, 1)], [square(0, 0, 1, 1)]), box('e', 1, 0, 2, 1)],
	},
	'a crumb beside another region': {
		code: 'stray-part',
		map: [
			multi('m', [square(0, 0, 1, 1)], [square(2, 0.5, 2.002, 0.502)]),
			region('e', [
				[1, 0],
				[2, 0],
				[2, 0.5],
				[2, 0.502],
				[2, 1],
				[1, 1],
			]),
		],
	},
};
