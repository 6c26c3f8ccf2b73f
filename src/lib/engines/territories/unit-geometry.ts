import { buildGraph } from '../graph/build-graph.ts';
import type { RegionGraph } from '../graph/region-graph.ts';

/**
 * Where units lie and how large they are, once for a boundary set. All typed arrays, so that it can be
 * handed to a worker. Line borders stand apart from the graph of what is joined: a border struck out by
 * hand is still a line, and a link across water is none.
 */
export interface UnitGeometry {
	/** longitude, latitude of the middle of each unit, interleaved, degrees */
	at: Float64Array;
	areaKm2: Float64Array;
	/** length of each unit's whole outline in metres; null where unknown: then there is no shape */
	outlineMetres: Float64Array | null;
	/** units that share a line, with the metres of each entry of `lines.targets` */
	lines: RegionGraph;
	lineMetres: Float64Array;
	/** corners of each unit's convex hull, x y z on the unit sphere of equal area; null where unknown */
	hullStarts: Uint32Array | null;
	hullVectors: Float64Array | null;
}

export interface GeometryParts {
	/** interleaved degrees */
	at: Float64Array;
	areaKm2: Float64Array;
	/** every pair that shares a line once, with its metres */
	borders: { a: ArrayLike<number>; b: ArrayLike<number>; metres: ArrayLike<number> };
	/** metres of each unit's outline that face no unit; absent: perimeters are unknown */
	outerMetres?: Float64Array;
}

/**
 * Geometry from rows of regions and borders, without outlines: for what is not a coverage. Shapes by
 * smallest circle are left out, those by perimeter too without `outerMetres`.
 * @throws RangeError when lists differ in length or a pair is no pair of units
 */
export function geometryFrom({ at, areaKm2, borders, outerMetres }: GeometryParts): UnitGeometry {
	const units = areaKm2.length;
	if (at.length !== 2 * units || (outerMetres && outerMetres.length !== units)) {
		throw new RangeError('Places, areas and outer metres must be of the same units.');
	}
	const { lines, lineMetres } = linesFrom(units, borders);
	const outlineMetres = outerMetres?.slice() ?? null;
	if (outlineMetres) {
		for (let u = 0; u < units; u++) {
			for (let i = lines.offsets[u]; i < lines.offsets[u + 1]; i++)
				outlineMetres[u] += lineMetres[i];
		}
	}
	return { at, areaKm2, outlineMetres, lines, lineMetres, hullStarts: null, hullVectors: null };
}

/** Lines as a graph with lengths by entry; several lines between one pair are added up. */
export function linesFrom(units: number, { a, b, metres }: GeometryParts['borders']) {
	const lines = buildGraph(units, a, b);
	const lineMetres = new Float64Array(lines.targets.length);
	const add = (u: number, v: number, length: number) => {
		const row = lines.targets.subarray(lines.offsets[u], lines.offsets[u + 1]);
		lineMetres[lines.offsets[u] + row.indexOf(v)] += length;
	};
	for (let i = 0; i < a.length; i++) {
		add(a[i], b[i], metres[i]);
		add(b[i], a[i], metres[i]);
	}
	return { lines, lineMetres };
}
