import type { Naming } from './keys.ts';
import type { Found } from './question.ts';
import type { RawLayer } from './raw-layer.ts';

/** What was recognised in a file that was read. */
export function foundIn(layer: RawLayer, crs: string, naming: Naming | null): Found {
	const columns = layer.table.columns.map((name, c) => {
		const values = layer.table.rows.map((row) => row[c] ?? null);
		const filled = values.filter((value) => value !== null && value !== '').map(String);
		const examples = [...new Set(filled.slice(0, 1000))].slice(0, 3);
		return {
			name,
			examples,
			distinct: new Set(filled).size,
			empty: values.length - filled.length,
		};
	});
	return {
		format: layer.format,
		layers: [],
		layer: layer.layer,
		crs,
		encoding: layer.encoding,
		features: layer.regions,
		columns,
		keyField: naming?.keyField ?? null,
		nameField: naming?.nameField ?? null,
		likeness: [layer.format, layer.layer ?? '', ...layer.table.columns].join('\u001f'),
		sketch: null,
	};
}
