/** On these every area is true to every other: right for maps that fill areas with colour. */
export const equalAreaKinds = [
	'albers',
	'lambert-azimuthal',
	'cylindrical-equal-area',
	'transverse-equal-area',
	'equal-earth',
] as const;

/** On these areas are not true. */
export const otherKinds = [
	'lambert-conformal',
	'equidistant-conic',
	'equidistant-azimuthal',
	'mercator',
	'transverse-mercator',
] as const;

export const projectionKinds = [...equalAreaKinds, ...otherKinds] as const;
export type ProjectionKind = (typeof projectionKinds)[number];

/** Which figures a user may set; all others follow from the regions. */
export const kindSettings: Record<
	ProjectionKind,
	{ parallels: 0 | 1 | 2; longitude: boolean; latitude: boolean }
> = {
	albers: { parallels: 2, longitude: true, latitude: false },
	'lambert-azimuthal': { parallels: 0, longitude: true, latitude: true },
	'cylindrical-equal-area': { parallels: 1, longitude: true, latitude: false },
	'transverse-equal-area': { parallels: 0, longitude: true, latitude: false },
	'equal-earth': { parallels: 0, longitude: true, latitude: false },
	'lambert-conformal': { parallels: 2, longitude: true, latitude: false },
	'equidistant-conic': { parallels: 2, longitude: true, latitude: false },
	'equidistant-azimuthal': { parallels: 0, longitude: true, latitude: true },
	mercator: { parallels: 0, longitude: true, latitude: false },
	'transverse-mercator': { parallels: 0, longitude: true, latitude: false },
};
