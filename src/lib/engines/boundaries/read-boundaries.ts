import { bordersOf } from '../borders/borders-of.ts';
import { buildCoverage } from './build-coverage.ts';
import { nameRegions } from './keys.ts';
import { placeLongitudes } from './longitudes.ts';
import {
	defaultLimits,
	noiseMetres,
	type BoundaryOptions,
	type ByteSource,
	type Watch,
} from './options.ts';
import { outlinesOf } from './outlines-of.ts';
import type { RawLayer } from './raw-layer.ts';
import { Cancelled, Refusal } from './refusal.ts';
import { reproject } from './reproject.ts';
import type { BoundariesResult } from './result.ts';
import { readLayer } from './readers/index.ts';
import { ringFindings } from './ring-findings.ts';

/**
 * Reads a boundary file into a coverage, its borders, the attribute table and what there was to note.
 * Input: bytes of GeoJSON, TopoJSON or a zipped shapefile; options as in the API description.
 * Guarantees: an accepted coverage keeps its invariants (`coverageFaults`); the pairs and metres do not
 * depend on the order of features, the starting vertex or the direction of rings.
 * Failures: `refused` with a stable code and a sentence that names the feature and the place;
 * `cancelled` when `watch.cancelled` said so. Nothing is kept of a refused file.
 */
export async function readBoundaries(
	source: ByteSource,
	options: BoundaryOptions = {},
	watch: Watch = {},
): Promise<BoundariesResult> {
	try {
		const limits = { ...defaultLimits, ...options.limits };
		const layer = await readLayer(source, { ...options, limits }, watch);
		return assemble(layer, options, watch);
	} catch (error) {
		if (error instanceof Cancelled) return { status: 'cancelled' };
		if (!(error instanceof Refusal)) throw error;
		const { code, message, findings } = error;
		return { status: 'refused', code, message, findings };
	}
}

function assemble(layer: RawLayer, options: BoundaryOptions, watch: Watch): BoundariesResult {
	const stage = (message: string, share: number) => {
		if (watch.cancelled?.()) throw new Cancelled();
		watch.progress?.(message, share);
	};
	stage('Placing the positions', 0.5);
	const crs = reproject(layer, options);
	const west = placeLongitudes(layer);
	const naming = nameRegions(layer.table, featuresWithArea(layer), options);
	if (naming.keys.length === 0) {
		throw new Refusal('no-areas', 'No feature of the file has an area.');
	}
	stage('Matching the outlines', 0.6);
	const { outlines, repairs } = outlinesOf(layer, west, naming.regionOf, naming.keys.length);
	stage('Cutting the shared borders', 0.8);
	const coverage = buildCoverage(outlines, naming.keys, naming.names);
	stage('Measuring the borders', 0.9);
	const borders = bordersOf(coverage, options);
	return {
		status: 'accepted',
		coverage,
		borders,
		attributes: layer.table.take(naming.featureOf),
		findings: [...layer.findings, ...naming.findings, ...ringFindings(repairs, naming)],
		source: {
			format: layer.format,
			layer: layer.layer,
			crs,
			encoding: layer.encoding,
			features: layer.regions,
			toleranceMetres: options.toleranceMetres ?? noiseMetres,
		},
	};
}

function featuresWithArea(layer: RawLayer): boolean[] {
	const kept: boolean[] = [];
	for (let f = 0; f < layer.regions; f++) {
		kept.push(layer.partsBefore(f + 1) > layer.partsBefore(f));
	}
	return kept;
}
