import { knownSystems } from './epsg-systems.ts';

/** Geographic systems on the ellipsoid of GRS 80, which lie within a metre of WGS 84. */
const geographic = new Set([4167, 4171, 4258, 4283, 4612, 4674, 4758, 6318, 6668, 7844]);

/** The PROJ string or name of an EPSG code, or null where it is not known; any other can be given as WKT. */
export function epsgDefinition(code: number): string | null {
	const listed = knownSystems.find(([known]) => known === code);
	if (listed) return listed[3];
	if (code === 4269) return '+proj=longlat +datum=NAD83';
	if (geographic.has(code)) return '+proj=longlat +ellps=GRS80';
	return utmDefinition(code) ?? (code === 5041 || code === 5042 ? `EPSG:${code}` : null);
}

const grs80 = '+ellps=GRS80 +towgs84=0,0,0';

/** Codes of the UTM zones: on WGS 84, ETRS89, NAD83, GDA94, GDA2020 and SIRGAS 2000. */
function utmDefinition(code: number): string | null {
	const within = (first: number, last: number) => code >= first && code <= last;
	const zone = code % 100;
	if (within(32601, 32660) || within(32701, 32760)) return `EPSG:${code}`;
	if (within(25828, 25838)) return utm(zone, grs80);
	if (within(26901, 26923)) return utm(zone, '+datum=NAD83');
	if (within(28348, 28358)) return utm(zone, `+south ${grs80}`);
	if (within(7846, 7859)) return utm(zone, `+south ${grs80}`);
	if (within(31978, 31985)) return utm(code - 31960, `+south ${grs80}`);
	return null;
}

const utm = (zone: number, datum: string) => `+proj=utm +zone=${zone} ${datum} +units=m`;

/** A name for people: the register's where it is known here. */
export function systemName(code: number): string {
	const listed = knownSystems.find(([known]) => known === code);
	if (listed) return listed[1];
	const definition = utmDefinition(code);
	if (!definition) return `EPSG:${code}`;
	const zone = /zone=(\d+)/.exec(definition)?.[1] ?? String(code % 100);
	const isSouth = definition.includes('+south') || Math.floor(code / 100) === 327;
	return `UTM zone ${zone} ${isSouth ? 'south' : 'north'}`;
}
