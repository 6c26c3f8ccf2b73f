import { doubleArea } from '../geometry/rings.ts';
import type { Finding } from './finding.ts';
import { nameRegions } from './keys.ts';
import { placeLongitudes } from './longitudes.ts';
import { matchOutlines } from './match.ts';
import {
	defaultLimits,
	noiseMetres,
	type BoundaryOptions,
	type ByteSource,
	type Watch,
} from './options.ts';
import { eachRing, outlinesOf } from './outlines-of.ts';
import type { RawLayer } from './raw-layer.ts';
import { Cancelled, Refusal } from './refusal.ts';
import { reproject } from './reproject.ts';
import type { BoundariesResult } from './result.ts';
import { readLayer } from './readers/index.ts';
import { crossingFinding, ringFindings } from './ring-findings.ts';
import { surveyFindings } from './survey-findings.ts';

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
	const { west, crossing } = placeLongitudes(layer);
	stage('Matching the outlines', 0.6);
	const { naming, repairs, matched, left } = matchLayer(layer, west, options, stage);
	const { coverage, survey } = matched;
	return {
		status: 'accepted',
		coverage,
		borders: survey.borders,
		attributes: layer.table.take(naming.featureOf),
		findings: [
			...layer.findings,
			...naming.findings,
			...leftOutFinding(left),
			...crossingFinding(crossing, naming),
			...ringFindings(repairs, naming, layer.format),
			...matched.findings,
			...surveyFindings(survey, coverage.keys),
		],
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

/**
 * Names the features with an area and matches them. What has no area left once its spikes are gone is
 * left out, and the rest is named and matched again.
 */
function matchLayer(
	layer: RawLayer,
	west: number,
	options: BoundaryOptions,
	stage: (message: string, share: number) => void,
) {
	const kept = featuresWithArea(layer);
	for (;;) {
		const naming = nameRegions(layer.table, kept, options);
		if (naming.keys.length === 0) {
			throw new Refusal('no-areas', 'No feature of the file has an area.');
		}
		const { outlines, repairs } = outlinesOf(layer, west, naming.regionOf, naming.keys.length);
		stage('Cutting the shared borders', 0.75);
		const matched = matchOutlines(outlines, naming.keys, naming.names, options);
		if (!('vanished' in matched)) {
			const left = kept.flatMap((has, f) => (has ? [] : [f]));
			return { naming, repairs, matched, left };
		}
		const gone = new Set(matched.vanished);
		naming.regionOf.forEach((region, f) => {
			if (gone.has(region)) kept[f] = false;
		});
	}
}

/** Has at least one ring with three points that enclose something. */
function featuresWithArea(layer: RawLayer): boolean[] {
	const kept: boolean[] = new Array(layer.regions).fill(false);
	for (const ring of eachRing(layer)) {
		if (ring.isHole || kept[ring.feature] || ring.to - ring.from < 3) continue;
		kept[ring.feature] = doubleArea(layer.points.items, ring.from, ring.to) !== 0;
	}
	return kept;
}

function leftOutFinding(features: number[]): Finding[] {
	if (features.length === 0) return [];
	const some = features.slice(0, 10).map((f) => f + 1);
	const message = `Features without an area were left out: number ${some.join(', ')}${features.length > 10 ? ` and ${features.length - 10} more` : ''} in the file.`;
	return [{ code: 'no-area', severity: 'warning', message, regions: [], at: null }];
}
