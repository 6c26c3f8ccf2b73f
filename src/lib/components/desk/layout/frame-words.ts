import type { ClusterReport } from '$lib/engines/sheet';
import type { ProjectionKind } from '$lib/engines/sheet/layout/projection-kinds';
import { equalAreaKinds, otherKinds } from '$lib/engines/sheet/layout/projection-kinds';

export const kindWords: Record<ProjectionKind, string> = {
	albers: 'Albers equal-area conic',
	'lambert-azimuthal': 'Lambert azimuthal equal-area',
	'cylindrical-equal-area': 'Cylindrical equal-area',
	'transverse-equal-area': 'Transverse cylindrical equal-area',
	'equal-earth': 'Equal Earth',
	'lambert-conformal': 'Lambert conformal conic',
	'equidistant-conic': 'Equidistant conic',
	'equidistant-azimuthal': 'Azimuthal equidistant',
	mercator: 'Mercator',
	'transverse-mercator': 'Transverse Mercator',
};

export const projectionOptions = [
	{ value: 'auto', label: 'chosen to suit the regions' },
	...equalAreaKinds.map((value) => ({ value, label: kindWords[value] })),
	...otherKinds.map((value) => ({ value, label: `${kindWords[value]} (areas not true)` })),
];

export const stepOptions = [
	{ value: 'auto', label: 'as suits the map' },
	...[30, 20, 15, 10, 5, 2, 1, 0.5].map((step) => ({ value: String(step), label: `${step}°` })),
	{ value: String(10 / 60), label: '10′' },
	{ value: String(5 / 60), label: '5′' },
	{ value: String(1 / 60), label: '1′' },
];

const placeWords = {
	frame: 'in the map’s own frame',
	box: 'in a box of its own',
	out: 'not on this sheet',
} as const;

export const placeOptions = (suits: ClusterReport['suits']) => [
	{ value: '', label: `as suits: ${placeWords[suits]}` },
	...Object.entries(placeWords).map(([value, label]) => ({ value, label })),
];

/** `1 : 4,000,000`, three figures. */
export const ratioWords = (ratio: number): string =>
	`1 : ${Number(ratio.toPrecision(3)).toLocaleString('en-GB')}`;

/** A figure that is easy to keep for the next sheet: the next rounder one at a smaller scale. */
export function rounderRatio(ratio: number): number {
	const power = 10 ** (Math.floor(Math.log10(ratio)) - 1);
	return Math.ceil(ratio / power) * power;
}
