/**
 * What a projection cannot show. In: the kind, the figures set, the extent of the regions. Out: null, or
 * why it is refused, in words for the user.
 */
import type { ProjectionKind } from '../layout/projection-kinds.ts';
import { latitudeWords, longitudeWords } from './degrees.ts';
import { lonStep, type Extent } from './extent.ts';

export interface ProjectionFigures {
	kind: ProjectionKind;
	parallels: [number, number];
	/** longitude, latitude */
	centre: [number, number];
}

const radians = Math.PI / 180;
const conics: ProjectionKind[] = ['albers', 'lambert-conformal', 'equidistant-conic'];

/** Degrees from the centre at which an azimuthal draws a place out into an arc. */
const furthestAzimuthal = 150;
/** Degrees from the central meridian that a transverse projection may show. */
const furthestTransverse = { 'transverse-equal-area': 85, 'transverse-mercator': 60 };
const furthestMercator = 85;
const furthestParallel = 80;
/** Parallels nearer than this to being opposite give a cone that is almost a cylinder. */
const opposed = 0.5;

export function refusalOf(figures: ProjectionFigures, extent: Extent): string | null {
	const { kind } = figures;
	if (conics.includes(kind)) return conicRefusal(figures, extent);
	if (kind === 'cylindrical-equal-area') return parallelRefusal(figures.parallels[0]);
	if (kind === 'mercator') return mercatorRefusal(extent);
	if (kind === 'lambert-azimuthal' || kind === 'equidistant-azimuthal')
		return azimuthalRefusal(figures, extent);
	if (kind === 'transverse-equal-area' || kind === 'transverse-mercator')
		return transverseRefusal(kind, figures.centre[0], extent);
	return null;
}

function conicRefusal({ kind, parallels }: ProjectionFigures, { south, north }: Extent) {
	const [one, other] = parallels;
	if (Math.abs(one + other) < opposed) {
		return `Parallels ${latitudeWords(one)} and ${latitudeWords(other)} lie alike on both sides of the equator: the cone becomes a cylinder. Take other parallels, or the cylindrical equal-area.`;
	}
	const tooFar = parallels.find((lat) => Math.abs(lat) > furthestParallel + 5);
	if (tooFar !== undefined)
		return `A standard parallel at ${latitudeWords(tooFar)} is too near the pole for a cone: at most 85°. For a pole take an azimuthal.`;
	const far = one + other > 0 ? -south : north;
	if (kind === 'lambert-conformal' && far > furthestParallel)
		return `The Lambert conformal conic grows without end towards the far pole, and the regions reach ${latitudeWords(one + other > 0 ? south : north)}.`;
	return null;
}

function parallelRefusal(lat: number): string | null {
	if (Math.abs(lat) <= furthestParallel) return null;
	return `A cylinder true along ${latitudeWords(lat)} would squeeze the map to a strip: at most ${furthestParallel}°.`;
}

function mercatorRefusal({ south, north }: Extent): string | null {
	const far = north > -south ? north : south;
	if (Math.abs(far) <= furthestMercator) return null;
	return `Mercator grows without end towards the poles, and the regions reach ${latitudeWords(far)}: at most ${furthestMercator}°.`;
}

/** Places along the rim of an extent and at its corners. */
function rim({ west, east, south, north }: Extent): [number, number][] {
	const steps = Array.from({ length: 25 }, (_, i) => i / 24);
	return steps.flatMap((share): [number, number][] => {
		const [lon, lat] = [west + share * (east - west), south + share * (north - south)];
		return [
			[lon, south],
			[lon, north],
			[west, lat],
			[east, lat],
		];
	});
}

function azimuthalRefusal({ centre: [lon0, lat0] }: ProjectionFigures, extent: Extent) {
	const away = ([lon, lat]: [number, number]) => {
		const cosine =
			Math.sin(lat0 * radians) * Math.sin(lat * radians) +
			Math.cos(lat0 * radians) * Math.cos(lat * radians) * Math.cos((lon - lon0) * radians);
		return Math.acos(Math.min(1, Math.max(-1, cosine))) / radians;
	};
	const furthest = Math.max(...rim(extent).map(away));
	if (furthest <= furthestAzimuthal) return null;
	return `The centre ${latitudeWords(lat0)} ${longitudeWords(lon0)} is out of reach: regions lie ${Math.round(furthest)}° from it, and beyond ${furthestAzimuthal}° they would be drawn out round the rim.`;
}

function transverseRefusal(kind: keyof typeof furthestTransverse, lon0: number, extent: Extent) {
	const away = ([lon, lat]: [number, number]) => {
		const step = Math.abs(lonStep(lon0, lon));
		if (Math.abs(lat) > 89.9) return 0;
		if (step > 90) return 180 - step < 1e-9 ? 0 : 90;
		return Math.asin(Math.cos(lat * radians) * Math.sin(step * radians)) / radians;
	};
	const furthest = Math.max(...rim(extent).map(away));
	if (furthest <= furthestTransverse[kind]) return null;
	return `The central meridian ${longitudeWords(lon0)} is out of reach: regions lie ${Math.round(furthest)}° or more to its side, at most ${furthestTransverse[kind]}° can be shown.`;
}
