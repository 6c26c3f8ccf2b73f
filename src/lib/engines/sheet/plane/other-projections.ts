/** Projections on which areas are not true. Each says so in the words that stand on the sheet. */
import {
	geoAzimuthalEquidistant,
	geoConicConformal,
	geoConicEquidistant,
	geoMercator,
	geoTransverseMercator,
} from 'd3-geo';
import { latitudeWords, longitudeWords } from './degrees.ts';
import { opposite, unit, type ChosenProjection } from './projections.ts';

const untrue = 'Areas are not true on it.';
const parallelWords = (south: number, north: number) =>
	`parallels ${latitudeWords(south)} and ${latitudeWords(north)}`;

/** Source: Snyder 1987, USGS PP 1395, pp. 104-110. */
export function lambertConformal(south: number, north: number, centre: number): ChosenProjection {
	return {
		projection: unit(geoConicConformal().parallels([south, north]).rotate([-centre, 0])),
		sentence: `Lambert conformal conic, ${parallelWords(south, north)}, centre ${longitudeWords(centre)}. ${untrue}`,
		cut: opposite(centre),
		equalArea: false,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 111-115. */
export function equidistantConic(south: number, north: number, centre: number): ChosenProjection {
	return {
		projection: unit(geoConicEquidistant().parallels([south, north]).rotate([-centre, 0])),
		sentence: `Equidistant conic, ${parallelWords(south, north)}, centre ${longitudeWords(centre)}. ${untrue}`,
		cut: opposite(centre),
		equalArea: false,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 191-202. */
export function equidistantAzimuthal(lat: number, lon: number): ChosenProjection {
	const centre =
		Math.abs(lat) === 90 ? latitudeWords(lat) : `${latitudeWords(lat)} ${longitudeWords(lon)}`;
	return {
		projection: unit(geoAzimuthalEquidistant().rotate([-lon, -lat])),
		sentence: `Azimuthal equidistant, distances true from ${centre}. ${untrue}`,
		cut: null,
		equalArea: false,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 38-47. */
export function mercator(centre: number): ChosenProjection {
	return {
		projection: unit(geoMercator().rotate([-centre, 0])),
		sentence: `Mercator, true along the equator, centre ${longitudeWords(centre)}. ${untrue}`,
		cut: opposite(centre),
		equalArea: false,
	};
}

/** Source: Snyder 1987, USGS PP 1395, pp. 48-65. */
export function transverseMercator(centre: number): ChosenProjection {
	return {
		projection: unit(geoTransverseMercator().rotate([-centre, 0, 0])),
		sentence: `Transverse Mercator, true along ${longitudeWords(centre)}. ${untrue}`,
		cut: null,
		equalArea: false,
	};
}
