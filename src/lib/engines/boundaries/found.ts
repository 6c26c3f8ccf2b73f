import type { Naming } from './keys.ts';
import { likenessOf } from './likeness.ts';
import type { Found, FoundLayer, Sketch } from './question.ts';
import type { RawLayer } from './raw-layer.ts';

/** What was recognised in a file that was read. */
export function foundIn(
	layer: RawLayer,
	crs: string | null,
	naming: Naming | null,
	sketch: Sketch | null,
): Found {
	const names = layer.layers.map(({ name }) => name);
	return {
		format: layer.format,
		layers: layer.layers,
		layer: layer.layer,
		crs,
		encoding: layer.encoding,
		features: layer.regions,
		columns: layer.table.columns.map((name, c) => ({ name, ...columnNote(layer, c) })),
		keyField: naming?.keyField ?? null,
		nameField: naming?.nameField ?? null,
		likeness: likenessOf(layer.format, names, layer.table.columns),
		sketch,
	};
}

/** What is known of a file of which no layer was read yet. */
export const foundLayers = (format: string, layers: FoundLayer[]): Found => ({
	format,
	layers,
	layer: null,
	crs: null,
	encoding: null,
	features: null,
	columns: [],
	keyField: null,
	nameField: null,
	likeness: likenessOf(
		format,
		layers.map(({ name }) => name),
		[],
	),
	sketch: null,
});

const mostExamples = 3;

function columnNote(layer: RawLayer, column: number) {
	const distinct = new Set<unknown>();
	const examples: string[] = [];
	let empty = 0;
	for (const row of layer.table.rows) {
		const value = row[column] ?? null;
		if (value === null || value === '') empty++;
		else if (!distinct.has(value)) {
			distinct.add(value);
			if (examples.length < mostExamples) examples.push(String(value));
		}
	}
	return { examples, distinct: distinct.size, empty };
}
