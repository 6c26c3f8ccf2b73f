import { writeShapefileZip } from './shapefile.ts';
import { bytesOf, conterminousStates, usAtlas, worldAtlas, type Areas } from './atlas.ts';

/** A file as the browser's file chooser takes it. */
export interface ChosenFile {
	name: string;
	mimeType: string;
	buffer: Buffer;
}

const geoJson = (name: string, areas: unknown): ChosenFile => ({
	name,
	mimeType: 'application/geo+json',
	buffer: Buffer.from(bytesOf(areas)),
});

/** WGS 84 in longitude and latitude, as OGC 01-009 (WKT 1) writes it. */
const wgs84 =
	'GEOGCS["GCS_WGS_1984",DATUM["D_WGS_1984",SPHEROID["WGS_1984",6378137.0,298.257223563]],PRIMEM["Greenwich",0.0],UNIT["Degree",0.0174532925199433]]';

/** The 48 conterminous states and the District of Columbia: 49 regions, 107 line borders, 2 point touches. */
export const statesGeoJson = (): ChosenFile => geoJson('states.geojson', conterminousStates());

export const statesShapefile = (): ChosenFile => ({
	name: 'states.zip',
	mimeType: 'application/zip',
	buffer: Buffer.from(
		writeShapefileZip({ features: withKeys(conterminousStates()), prj: wgs84, name: 'states' }),
	),
});

/** FIPS codes of American Samoa, Guam, the Northern Marianas, Puerto Rico and the Virgin Islands. */
const territories = new Set(['60', '66', '69', '72', '78']);

/** The 3,142 counties and equivalents of the 50 states and DC. */
export function countiesGeoJson(): ChosenFile {
	const counties = usAtlas('counties');
	const features = counties.features.filter(({ id }) => !territories.has(String(id).slice(0, 2)));
	return geoJson('counties.geojson', { ...counties, features });
}

export const countriesGeoJson = (): ChosenFile => geoJson('countries.geojson', worldAtlas('110m'));

export const textFile = (name: string, text: string): ChosenFile => ({
	name,
	mimeType: 'application/octet-stream',
	buffer: Buffer.from(text),
});

/** Two squares that share a side, with the names given. */
export function twoSquares(west: string, east: string, name = 'squares.geojson'): ChosenFile {
	const square = (key: string, called: string, from: number) => ({
		type: 'Feature',
		id: key,
		properties: { name: called },
		geometry: {
			type: 'Polygon',
			coordinates: [
				[
					[from, 0],
					[from + 1, 0],
					[from + 1, 1],
					[from, 1],
					[from, 0],
				],
			],
		},
	});
	return geoJson(name, {
		type: 'FeatureCollection',
		features: [square('w', west, 10), square('e', east, 11)],
	});
}

const withKeys = (areas: Areas) =>
	areas.features.map((feature) => ({
		...feature,
		properties: { fips: String(feature.id), name: feature.properties.name },
	}));
