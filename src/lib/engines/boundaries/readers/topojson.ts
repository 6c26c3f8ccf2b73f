import type { GeometryObject as Geometry, Properties, Topology } from 'topojson-specification';
import { feature } from 'topojson-client';
import type { BoundaryOptions, ByteSource, Limits } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { JsonBytes } from './json-bytes.ts';
import { checkTopology } from './topojson-check.ts';
import { layerNeeded } from './zipped-shapefile.ts';
import { wholeFile } from './whole.ts';

type GeometryObject = Geometry<Properties>;

/** TopoJSON (specification 1.0): the file is held whole, its arcs checked, its areas written out. */
export async function readTopoJson(
	source: ByteSource,
	options: BoundaryOptions & { limits: Limits },
): Promise<RawLayer> {
	const bytes = await wholeFile(source, Math.min(options.limits.wholeBytes, 2 ** 29 - 24));
	const json = new JsonBytes(options.limits.nesting);
	json.bytes = bytes;
	json.last = true;
	if (bytes[0] === 0xef) json.at = 3;
	const topology = json.value() as Topology;
	checkTopology(topology);
	const name = chooseObject(topology, options.layer);
	const layer = new RawLayer(options.limits);
	layer.format = 'TopoJSON';
	layer.layer = name;
	layer.crsByFormat = 'EPSG:4326';
	layer.encoding = json.encoding;
	for (const geometry of geometriesOf(topology.objects[name]))
		addGeometry(topology, geometry, layer);
	return layer;
}

function chooseObject(topology: Topology, layer?: string): string {
	const names = Object.keys(topology.objects);
	const areas = names.filter((name) => geometriesOf(topology.objects[name]).some(isArea));
	if (layer !== undefined) {
		if (names.includes(layer)) return layer;
		throw layerNeeded(`There is no layer "${layer}".`, areas);
	}
	if (areas.length === 0) throw new Refusal('no-areas', 'The file holds no areas.');
	if (areas.length > 1) throw layerNeeded('The file holds several layers.', areas);
	return areas[0];
}

function geometriesOf(object: GeometryObject): GeometryObject[] {
	return object.type === 'GeometryCollection' ? object.geometries : [object];
}

const isArea = (geometry: GeometryObject) => /Polygon$/.test(String(geometry.type));

function addGeometry(topology: Topology, geometry: GeometryObject, layer: RawLayer): void {
	layer.startRegion();
	layer.table.add(geometry.id ?? null, geometry.properties ?? null);
	for (const area of geometriesOf(geometry).filter(isArea)) {
		const written = feature(topology, area) as GeoJSON.Feature;
		if (written.geometry.type === 'Polygon') addPart(written.geometry.coordinates, layer);
		if (written.geometry.type === 'MultiPolygon') {
			for (const part of written.geometry.coordinates) addPart(part, layer);
		}
	}
}

function addPart(rings: GeoJSON.Position[][], layer: RawLayer): void {
	layer.startPart();
	for (const ring of rings) {
		layer.startRing();
		for (const [x, y] of ring) layer.point(x, y);
	}
}
