import {
	geoAzimuthalEqualArea,
	geoConicEqualArea,
	geoEqualEarth,
	geoProjection,
	type GeoProjection,
	type GeoRawProjection,
} from 'd3-geo';
import { latitudeWords, longitudeWords } from './degrees.ts';
import { wrapLon } from './extent.ts';

/** A projection on the unit sphere, in words that stand on the sheet. */
export interface ChosenProjection {
	/** d3-geo, scale 1, nothing shifted: x to the right and y down, in radii of the sphere */
	projection: GeoProjection;
	sentence: string;
	/** the meridian along which the map is open, degrees; null where it is open along none */
	cut: number | null;
	/** false where areas are not true */
	equalArea: boolean;
}

export const unit = <P extends GeoProjection>(projection: P): P =>
	projection.scale(1).translate([0, 0]).precision(0) as P;

/** The meridian opposite to the central one. */
export const opposite = (centre: number): number => wrapLon(centre + 180);

type Formula = (a: number, b: number) => [number, number];

const withInverse = (formula: Formula, inverse: Formula): GeoRawProjection =>
	Object.assign(formula, { invert: inverse });

/** Source: Snyder 1987, USGS PP 1395, pp. 98-103. */
export function albers(south: number, north: number, centre: number): ChosenProjection {
	return {
		projection: unit(geoConicEqualArea().parallels([south, north]).rotate([-centre, 0])),
		sentence: `Albers equal-area conic, parallels ${latitudeWords(south)} and ${latitudeWords(north)}, centre ${longitudeWords(centre)}.`,
		cut: opposite(centre),
		equalArea: true,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 182-190. */
export function lambertAzimuthal(lat: number, lon: number): ChosenProjection {
	const centre =
		Math.abs(lat) === 90 ? latitudeWords(lat) : `${latitudeWords(lat)} ${longitudeWords(lon)}`;
	return {
		projection: unit(geoAzimuthalEqualArea().rotate([-lon, -lat])),
		sentence: `Lambert azimuthal equal-area, centre ${centre}.`,
		cut: null,
		equalArea: true,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 76-85, normal aspect. */
export function cylindrical(parallel: number, centre: number): ChosenProjection {
	const narrowing = Math.cos((parallel * Math.PI) / 180);
	const words = parallel === 0 ? '0°' : `${latitudeWords(parallel).replace(' N', '')} N and S`;
	return {
		projection: unit(
			geoProjection(
				withInverse(
					(lon, lat) => [lon * narrowing, Math.sin(lat) / narrowing],
					(x, y) => [x / narrowing, Math.asin(y * narrowing)],
				),
			).rotate([-centre, 0]),
		),
		sentence: `Cylindrical equal-area, true along ${words}, centre ${longitudeWords(centre)}.`,
		cut: opposite(centre),
		equalArea: true,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 76-85, transverse aspect. */
export function transverseCylindrical(centre: number): ChosenProjection {
	return {
		projection: unit(
			geoProjection(
				withInverse(
					(lon, lat) => [Math.sin(lat), -lon],
					(x, y) => [-y, Math.asin(x)],
				),
			).rotate([-centre, 0, 90]),
		),
		sentence: `Transverse cylindrical equal-area, true along ${longitudeWords(centre)}.`,
		cut: null,
		equalArea: true,
	};
}

/** Source: Savric, Patterson, Jenny 2019, doi 10.1080/13658816.2018.1504949. */
export function equalEarth(centre: number): ChosenProjection {
	return {
		projection: unit(geoEqualEarth().rotate([-centre, 0])),
		sentence: `Equal Earth, centre ${longitudeWords(centre)}.`,
		cut: opposite(centre),
		equalArea: true,
	};
}
