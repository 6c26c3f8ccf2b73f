import type { Feature, Geometry } from 'geojson';
import initSqlJs from 'sql.js';
import { wkbBytes, type WkbForm } from './wkb.ts';

export interface GeoPackageLayer {
	name: string;
	features: Feature<Geometry | null>[];
	/** as `gpkg_geometry_columns` declares it; GEOMETRY unless given */
	kind?: string;
	srs?: number;
	form?: WkbForm;
	/** envelope indicator 0 to 4 */
	envelope?: number;
	/** the bytes of a geometry, where they are not to be as the standard says */
	spoil?(bytes: Uint8Array): Uint8Array;
}

const systems = [
	[-1, 'NONE', -1, 'undefined'],
	[0, 'NONE', 0, 'undefined'],
	[
		4326,
		'EPSG',
		4326,
		'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]',
	],
	[3035, 'EPSG', 3035, 'undefined'],
	[
		900001,
		'HOUSE',
		1,
		'PROJCS["House grid",GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]],PROJECTION["Transverse_Mercator"],PARAMETER["latitude_of_origin",0],PARAMETER["central_meridian",15],PARAMETER["scale_factor",0.9996],PARAMETER["false_easting",500000],PARAMETER["false_northing",0],UNIT["metre",1]]',
	],
];

const quoted = (name: string) => `"${name.replaceAll('"', '""')}"`;

/** A GeoPackage (OGC 12-128r19) with tables of features; `more` is run at the end, to spoil it. */
export async function writeGeoPackage(layers: GeoPackageLayer[], more = ''): Promise<Uint8Array> {
	const { Database } = await initSqlJs();
	const database = new Database();
	database.exec(`
		PRAGMA application_id = 0x47504B47; PRAGMA user_version = 10300;
		CREATE TABLE gpkg_spatial_ref_sys (srs_name TEXT, srs_id INTEGER PRIMARY KEY, organization TEXT, organization_coordsys_id INTEGER, definition TEXT, description TEXT);
		CREATE TABLE gpkg_contents (table_name TEXT PRIMARY KEY, data_type TEXT, identifier TEXT, description TEXT, last_change TEXT, min_x REAL, min_y REAL, max_x REAL, max_y REAL, srs_id INTEGER);
		CREATE TABLE gpkg_geometry_columns (table_name TEXT, column_name TEXT, geometry_type_name TEXT, srs_id INTEGER, z TINYINT, m TINYINT);`);
	for (const [id, organization, code, definition] of systems) {
		database.run('INSERT INTO gpkg_spatial_ref_sys VALUES (?, ?, ?, ?, ?, NULL)', [
			`${organization} ${code}`,
			id,
			organization,
			code,
			definition,
		]);
	}
	for (const layer of layers) writeLayer(database, layer);
	if (more) database.exec(more);
	const bytes = database.export();
	database.close();
	return bytes;
}

function writeLayer(database: initSqlJs.Database, layer: GeoPackageLayer): void {
	const { name, features, kind = 'GEOMETRY', srs = 4326 } = layer;
	const columns = [...new Set(features.flatMap(({ properties }) => Object.keys(properties ?? {})))];
	const list = columns.map((column) => `, ${quoted(column)}`).join('');
	database.exec(`CREATE TABLE ${quoted(name)} (fid INTEGER PRIMARY KEY, geom ${kind}${list})`);
	database.run(
		"INSERT INTO gpkg_contents (table_name, data_type, identifier, srs_id) VALUES (?, 'features', ?, ?)",
		[name, name, srs],
	);
	database.run('INSERT INTO gpkg_geometry_columns VALUES (?, ?, ?, ?, 2, 2)', [
		name,
		'geom',
		kind,
		srs,
	]);
	const places = ['?', ...columns.map(() => '?')].join(', ');
	for (const feature of features) {
		const values = columns.map((column) => feature.properties?.[column] ?? null);
		database.run(`INSERT INTO ${quoted(name)} (geom${list}) VALUES (${places})`, [
			feature.geometry ? blob(feature.geometry, layer) : null,
			...values,
		]);
	}
}

/** The header of clause 2.1.3, an envelope of zeros, and the well-known binary. */
function blob(geometry: Geometry, { form, srs = 4326, envelope = 0, spoil }: GeoPackageLayer) {
	const little = form?.little ?? true;
	const header = new Uint8Array(8 + [0, 32, 48, 48, 64][envelope]);
	header.set([0x47, 0x50, 0, (little ? 1 : 0) | (envelope << 1)]);
	new DataView(header.buffer).setInt32(4, srs, little);
	const bytes = Uint8Array.from([...header, ...wkbBytes(geometry, form)]);
	return spoil ? spoil(bytes) : bytes;
}
