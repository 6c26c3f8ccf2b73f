import type { GeometryObject as Geometry, Properties, Topology } from 'topojson-specification';
import { feature } from 'topojson-client';
import type { BoundaryOptions, ByteSource, Limits } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import type { FoundLayer } from '../question.ts';
import { chooseLayer } from './choose-layer.ts';
import { JsonBytes } from './json-bytes.ts';
import { checkTopology } from './topojson-check.ts';
import { wholeFile } from './whole.ts';

type GeometryObject = Geometry<Properties>;

/** TopoJSON (specification 1.0): the file is held whole, its arcs checked, its areas written out. */
export async function readTopoJson(
	source: ByteSource,
	options: BoundaryOptions & { limits: Limits },
): Promise<RawLayer> {
	const bytes = await wholeFile(source, Math.min(options.limits.wholeBytes, 2 ** 29 - 24));
	const json = new JsonBytes(options.limits.nesting);
	json.hold(bytes, bytes.length);
	json.last = true;
	if (bytes[0] === 0xef) json.at = 3;
	const topology = json.value() as Topology;
	checkTopology(topology, options.limits);
	const layers = layersOf(topology);
	const { name } = chooseLayer('TopoJSON', layers, options.layer);
	const layer = new RawLayer(options.limits);
	layer.format = 'TopoJSON';
	layer.layer = name;
	layer.layers = layers;
	layer.crsByFormat = 'EPSG:4326';
	layer.encoding = json.encoding;
	for (const geometry of geometriesOf(topology.objects[name]))
		addGeometry(topology, geometry, layer);
	return layer;
}

/** Objects of the topology as layers. */
function layersOf(topology: Topology): FoundLayer[] {
	return Object.entries(topology.objects).map(([name, object]) => {
		const geometries = geometriesOf(object);
		return {
			name,
			features: geometries.length,
			areas: geometries.some((geometry) => [...unfolded(geometry)].some(isArea)),
			crs: null,
		};
	});
}

function geometriesOf(object: GeometryObject): GeometryObject[] {
	return object.type === 'GeometryCollection' ? object.geometries : [object];
}

const isArea = (geometry: GeometryObject) => /Polygon$/.test(String(geometry.type));

function addGeometry(topology: Topology, geometry: GeometryObject, layer: RawLayer): void {
	layer.startRegion();
	layer.table.add(geometry.id ?? null, geometry.properties ?? null);
	for (const area of unfolded(geometry)) {
		if (!isArea(area)) {
			if (area.type) layer.stray(area.type);
			continue;
		}
		const written = feature(topology, area) as GeoJSON.Feature;
		if (written.geometry.type === 'Polygon') addPart(written.geometry.coordinates, layer);
		if (written.geometry.type === 'MultiPolygon') {
			for (const part of written.geometry.coordinates) addPart(part, layer);
		}
	}
}

/** The geometries of a collection and of those within it. */
function* unfolded(geometry: GeometryObject): Generator<GeometryObject> {
	if (geometry.type !== 'GeometryCollection') yield geometry;
	else for (const inner of geometry.geometries) yield* unfolded(inner);
}

function addPart(rings: GeoJSON.Position[][], layer: RawLayer): void {
	layer.startPart();
	for (const ring of rings) {
		layer.startRing();
		for (const [x, y] of ring) layer.point(x, y);
	}
}
