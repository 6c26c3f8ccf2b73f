import type { DrawnText, ShapeLayer } from '../../sheet/index.ts';

/** Names of the layers as a viewer lists them. */
export const shapeWords: Record<ShapeLayer, string> = {
	sea: 'Sea',
	lakes: 'Lakes',
	hatch: 'Hatches',
	graticule: 'Graticule',
	water: 'Water',
	inset: 'Inset frames',
	'legend-ground': 'Ground of the legend',
	'neat-line': 'Neat line',
	ground: 'Grounds of texts',
	north: 'North arrow',
	legend: 'Collar',
};

export const textWords: Record<DrawnText['layer'], string> = {
	label: 'Names',
	title: 'Collar',
	collar: 'Collar',
	legend: 'Collar',
	water: 'Names of waters',
	graticule: 'Graticule',
	block: 'Text blocks',
};

const ranks: Record<string, string> = {
	region: 'Borders of regions',
	group: 'Borders of the level above',
	outer: 'Outer borders',
	weak: 'Weak borders',
	'weak-core': 'Weak borders, inner line',
	leader: 'Leader lines',
};

export const lineWords = (rank: string): string => ranks[rank] ?? `Lines: ${rank}`;
