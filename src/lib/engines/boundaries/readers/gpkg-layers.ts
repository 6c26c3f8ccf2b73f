import { epsgDefinition } from '../epsg.ts';
import type { FoundLayer } from '../question.ts';
import { Refusal } from '../refusal.ts';
import { quoted, type Sqlite, type Value } from './sqlite.ts';

/** A table of features of a GeoPackage. */
export interface GpkgLayer extends FoundLayer {
	geometryColumn: string;
}

const areaKinds = new Set(['POLYGON', 'MULTIPOLYGON', 'CURVEPOLYGON', 'MULTISURFACE', 'SURFACE']);
const anyKinds = new Set(['GEOMETRY', 'GEOMETRYCOLLECTION']);

/** The feature tables that `gpkg_contents` and `gpkg_geometry_columns` name (OGC 12-128r19, 1.1.3, 2.1.5). */
export function gpkgLayers(database: Sqlite): GpkgLayer[] {
	for (const name of ['gpkg_contents', 'gpkg_geometry_columns']) {
		if (!database.hasTable(name)) {
			const message = `The database is no GeoPackage: it has no table "${name}".`;
			throw new Refusal('unsupported-format', message);
		}
	}
	const named = database.rows(
		`SELECT c.table_name, g.column_name, g.geometry_type_name, g.srs_id
		 FROM gpkg_contents c JOIN gpkg_geometry_columns g ON g.table_name = c.table_name
		 WHERE c.data_type = 'features' LIMIT 1000`,
	);
	return [...named].map((row) => gpkgLayer(database, row));
}

function gpkgLayer(database: Sqlite, [table, column, kind, srs]: Value[]): GpkgLayer {
	const name = String(table);
	if (!database.hasTable(name)) {
		const message = `The GeoPackage names the layer "${name}", which is not in it.`;
		throw new Refusal('file-damaged', message);
	}
	const [[features]] = [...database.rows(`SELECT count(*) FROM ${quoted(name)}`)];
	const type = String(kind).toUpperCase();
	return {
		name,
		features: Number(features),
		areas: areaKinds.has(type) ? true : anyKinds.has(type) ? null : false,
		crs: systemOf(database, Number(srs)),
		geometryColumn: String(column),
	};
}

/** A system of `gpkg_spatial_ref_sys`: its EPSG code where that is known here, else its definition. */
function systemOf(database: Sqlite, id: number): string | null {
	// -1 and 0 stand for an undefined system (12-128r19, requirement 11)
	if (id <= 0 || !database.hasTable('gpkg_spatial_ref_sys')) return null;
	const sql =
		'SELECT organization, organization_coordsys_id, definition FROM gpkg_spatial_ref_sys WHERE srs_id = ?';
	const [row] = [...database.rows(sql, [id])];
	if (!row) return `EPSG:${id}`;
	const code = Number(row[1]);
	const isEpsg = String(row[0]).toUpperCase() === 'EPSG';
	const wkt = String(row[2] ?? '');
	const known = isEpsg && (code === 4326 || epsgDefinition(code) !== null);
	return known || !/^\s*\w+\s*\[/.test(wkt) ? `${String(row[0])}:${code}` : wkt;
}
