import proj4 from 'proj4';
import { epsgDefinition } from './epsg.ts';
import { Refusal } from './refusal.ts';

/** A coordinate system: its name for the record, and the way to longitude and latitude. */
export interface Crs {
	name: string;
	geographic: boolean;
	/** to degrees on WGS 84; null when the positions are that already */
	toLonLat: ((xy: [number, number]) => [number, number]) | null;
}

/** Systems in degrees that differ from WGS 84 by under about a metre, which no boundary file resolves. */
const asWgs84 = new Set(['WGS84', 'NAD83', 'ETRS89', 'none', '']);

/** More than any definition has; what is longer was made to keep a parser busy. */
const mostLetters = 16 * 1024;

/**
 * A system from `EPSG:n`, an OGC name or URN, WKT (as in a .prj file) or a PROJ string.
 * Refuses with `crs-missing` what cannot be understood, since guessing would move the map.
 */
export function crsOf(text: string): Crs {
	const code = epsgCode(text);
	if (/CRS:?84|CRS:84$/i.test(text) || code === 4326) {
		return { name: 'EPSG:4326', geographic: true, toLonLat: null };
	}
	const definition = code === null ? text : epsgDefinition(code);
	const name = code === null ? shortName(text) : `EPSG:${code}`;
	const projection = definition === null ? null : projectionOf(definition.slice(0, mostLetters));
	if (!projection || definition === null) {
		const message = `The coordinate system "${name}" is not known here. Give it as WKT or as a PROJ string.`;
		throw new Refusal('crs-missing', message);
	}
	const geographic = projection.projName === 'longlat';
	if (geographic && asWgs84.has(projection.datumCode ?? '') && !projection.datum_params) {
		return { name, geographic, toLonLat: null };
	}
	const toWgs84 = proj4(definition, 'EPSG:4326');
	return { name, geographic, toLonLat: (xy) => toWgs84.forward(xy) };
}

interface Projection {
	projName?: string;
	datumCode?: string;
	datum_params?: unknown;
}

function projectionOf(definition: string): Projection | null {
	try {
		return proj4.Proj(definition) as unknown as Projection;
	} catch {
		return null;
	}
}

function epsgCode(text: string): number | null {
	const found = /^(?:urn:ogc:def:crs:)?EPSG:(?:[\d.]*:)?(\d{4,6})$/i.exec(text.trim());
	const linked = /^https?:\/\/www\.opengis\.net\/def\/crs\/EPSG\/[\d.]+\/(\d{4,6})$/i.exec(
		text.trim(),
	);
	const code = found?.[1] ?? linked?.[1];
	return code === undefined ? null : Number(code);
}

/** The name inside a WKT, else the text itself, cut to a line. */
function shortName(text: string): string {
	return (/^\w+\s*\[\s*"([^"]+)"/.exec(text.trim())?.[1] ?? text).slice(0, 80);
}
