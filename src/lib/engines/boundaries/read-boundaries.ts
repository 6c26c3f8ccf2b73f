import { faultFindings } from './fault-findings.ts';
import { placeLongitudes } from './longitudes.ts';
import { matchLayer } from './match-layer.ts';
import { aboutKnown, mendLayer } from './mends/mend-layer.ts';
import {
	defaultLimits,
	noiseMetres,
	type BoundaryOptions,
	type ByteSource,
	type Watch,
} from './options.ts';
import type { RawLayer } from './raw-layer.ts';
import { Cancelled, Refusal } from './refusal.ts';
import { reproject } from './reproject.ts';
import type { BoundariesResult } from './result.ts';
import { foundIn } from './found.ts';
import type { Sketch } from './question.ts';
import { axesNote } from './questions/ask-axes.ts';
import { withQuestion } from './questions/ask.ts';
import { withSketches } from './questions/sketch-layers.ts';
import { readLayer } from './readers/index.ts';
import { crossingFinding, ringFindings } from './ring-findings.ts';
import { sketchOf } from './sketch.ts';

/**
 * Reads a boundary file into a coverage, its borders, the attribute table and what there was to note.
 * Input: bytes of GeoJSON, TopoJSON, a zipped shapefile, a GeoPackage, KML or KMZ, or a table with
 * well-known text, the last ones zipped too; options as in the API description.
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
		const layer = await readOrAsk(source, options, watch);
		const asked = { layer, sketch: sketchOf(layer), fileName: source.name, options };
		try {
			return await assemble(layer, asked.sketch, options, watch);
		} catch (error) {
			throw error instanceof Refusal ? withQuestion(error, asked) : error;
		}
	} catch (error) {
		if (error instanceof Cancelled) return { status: 'cancelled' };
		if (!(error instanceof Refusal)) throw error;
		const { code, message, findings, question } = error;
		return { status: 'refused', code, message, findings, question };
	}
}

async function readOrAsk(source: ByteSource, options: BoundaryOptions, watch: Watch) {
	const limited = { ...options, limits: { ...defaultLimits, ...options.limits } };
	try {
		return await readLayer(source, limited, watch);
	} catch (error) {
		throw error instanceof Refusal ? await withSketches(error, source, limited) : error;
	}
}

async function assemble(
	layer: RawLayer,
	sketch: Sketch | null,
	options: BoundaryOptions,
	watch: Watch,
): Promise<BoundariesResult> {
	const stage = (message: string, share: number) => {
		if (watch.cancelled?.()) throw new Cancelled();
		watch.progress?.(message, share);
	};
	stage('Placing the positions', 0.5);
	const crs = reproject(layer, options);
	if (layer.axesVary) layer.findings.push(...axesNote(sketch?.box ?? null, crs, options));
	const { west, crossing } = placeLongitudes(layer);
	stage('Matching the outlines', 0.6);
	const read = matchLayer(layer, west, options, stage);
	const mended = options.mends?.length ? await mendLayer(read, options, stage) : null;
	const { naming, matched } = mended ?? read;
	const { coverage, survey } = matched;
	const before = [
		...layer.findings,
		...naming.findings,
		...read.findings,
		...crossingFinding(crossing, naming),
		...ringFindings(read.repairs, naming, layer.format),
		...read.matched.findings,
	];
	const told = mended ? [...aboutKnown(before, naming.keys), ...mended.findings] : before;
	return {
		status: 'accepted',
		coverage,
		borders: survey.borders,
		attributes: layer.table.take(naming.featureOf),
		findings: [...told, ...faultFindings(matched, options)],
		source: {
			format: layer.format,
			layer: layer.layer,
			crs,
			encoding: layer.encoding,
			features: layer.regions,
			toleranceMetres: options.toleranceMetres ?? noiseMetres,
		},
		found: foundIn(layer, crs, naming, sketch),
	};
}
