/**
 * PROJ strings of systems that boundary files are often delivered in, besides those the projection
 * library knows (WGS 84, its UTM zones, web Mercator). Parameters as in the EPSG register, from memory;
 * any other system can be given as WKT or as a PROJ string.
 */
const definitions: Record<number, string> = {
	2056: '+proj=somerc +lat_0=46.9524055555556 +lon_0=7.43958333333333 +k_0=1 +x_0=2600000 +y_0=1200000 +ellps=bessel +towgs84=674.374,15.056,405.346 +units=m',
	2154: '+proj=lcc +lat_0=46.5 +lon_0=3 +lat_1=49 +lat_2=44 +x_0=700000 +y_0=6600000 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	2180: '+proj=tmerc +lat_0=0 +lon_0=19 +k=0.9993 +x_0=500000 +y_0=-5300000 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	3006: '+proj=utm +zone=33 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	3034: '+proj=lcc +lat_0=52 +lon_0=10 +lat_1=35 +lat_2=65 +x_0=4000000 +y_0=2800000 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	3035: '+proj=laea +lat_0=52 +lon_0=10 +x_0=4321000 +y_0=3210000 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	3067: '+proj=utm +zone=35 +ellps=GRS80 +towgs84=0,0,0 +units=m',
	3395: '+proj=merc +lon_0=0 +k=1 +x_0=0 +y_0=0 +datum=WGS84 +units=m',
	4258: '+proj=longlat +ellps=GRS80 +towgs84=0,0,0',
	4269: '+proj=longlat +datum=NAD83',
	5070: '+proj=aea +lat_0=23 +lon_0=-96 +lat_1=29.5 +lat_2=45.5 +x_0=0 +y_0=0 +datum=NAD83 +units=m',
	6933: '+proj=cea +lat_ts=30 +lon_0=0 +x_0=0 +y_0=0 +datum=WGS84 +units=m',
	27700:
		'+proj=tmerc +lat_0=49 +lon_0=-2 +k=0.9996012717 +x_0=400000 +y_0=-100000 +ellps=airy +towgs84=446.448,-125.157,542.06,0.15,0.247,0.842,-20.489 +units=m',
};

/** The PROJ string or name of an EPSG code, or null where it is not known. */
export function epsgDefinition(code: number): string | null {
	if (definitions[code]) return definitions[code];
	const zone = code % 100;
	if (code >= 25828 && code <= 25838) return utm(zone, '+ellps=GRS80 +towgs84=0,0,0');
	if (code >= 26901 && code <= 26923) return utm(zone, '+datum=NAD83');
	const isUtm = (code > 32600 && code <= 32660) || (code > 32700 && code <= 32760);
	return isUtm || code === 3857 || code === 5041 || code === 5042 ? `EPSG:${code}` : null;
}

const utm = (zone: number, datum: string) => `+proj=utm +zone=${zone} ${datum} +units=m`;
