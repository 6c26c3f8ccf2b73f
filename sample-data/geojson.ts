import type { District } from './survey.ts';

/** RFC 7946, one district a line so that two versions can be compared by eye. */
export function geojsonText(districts: readonly District[], name: string): string {
	const features = districts.map(({ polygons, ...properties }) =>
		JSON.stringify({ type: 'Feature', properties, geometry: geometryOf(polygons) }),
	);
	return collectionText(features, name);
}

export function collectionText(features: readonly string[], name: string): string {
	const head = `{"type":"FeatureCollection","name":${JSON.stringify(name)},"features":[`;
	return `${head}\n${features.join(',\n')}\n]}\n`;
}

export function geometryOf(polygons: District['polygons']) {
	return polygons.length === 1
		? { type: 'Polygon' as const, coordinates: polygons[0] }
		: { type: 'MultiPolygon' as const, coordinates: polygons };
}
