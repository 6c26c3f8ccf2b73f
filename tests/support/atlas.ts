import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { FeatureCollection, MultiPolygon, Polygon } from 'geojson';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';

const require = createRequire(import.meta.url);

/** FIPS codes of Alaska, Hawaii and the territories: what is left out of "the 48 states and DC". */
const outside = new Set(['02', '15', '60', '66', '69', '72', '78']);

export type Areas = FeatureCollection<Polygon | MultiPolygon, { name: string }>;

/** Boundaries of the U.S. Census Bureau from us-atlas, simplified and quantised by its maker. */
export function usAtlas(layer: 'states' | 'counties', file = `${layer}-10m.json`): Areas {
	return areas('us-atlas', file, layer);
}

/** Natural Earth countries from world-atlas. */
export function worldAtlas(scale: '110m' | '50m' | '10m'): Areas {
	return areas('world-atlas', `countries-${scale}.json`, 'countries');
}

/** The 48 conterminous states and the District of Columbia. */
export function conterminousStates(): Areas {
	const states = usAtlas('states');
	return { ...states, features: states.features.filter((f) => !outside.has(String(f.id))) };
}

export function topologyOf(pack: 'us-atlas' | 'world-atlas', file: string): Topology {
	return JSON.parse(readFileSync(require.resolve(`${pack}/${file}`), 'utf8'));
}

export const bytesOf = (value: unknown) => new TextEncoder().encode(JSON.stringify(value));

function areas(pack: 'us-atlas' | 'world-atlas', file: string, layer: string): Areas {
	const topology = topologyOf(pack, file);
	return feature(
		topology,
		topology.objects[layer] as GeometryCollection<{ name: string }>,
	) as Areas;
}
