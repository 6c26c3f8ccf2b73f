import type { Finding } from '../finding.ts';
import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Cancelled, Refusal } from '../refusal.ts';
import { csvLayout, type CsvLayout } from './csv-layout.ts';
import { csvRows } from './csv-rows.ts';
import { markedEncoding, WrongEncoding } from './decoded.ts';
import { firstBytes } from './whole.ts';
import { readWkt } from './wkt.ts';

type Options = BoundaryOptions & { limits: Limits };

/**
 * A delimited table (RFC 4180) with a column of well-known text; the delimiter and the column are found
 * by what they hold. Null when no column holds well-known text. In UTF-8 or UTF-16 where so marked or
 * valid, else in windows-1252 with a finding.
 */
export async function readCsv(
	source: ByteSource,
	options: Options,
	watch: Watch,
): Promise<RawLayer | null> {
	const marked = markedEncoding(await firstBytes(source));
	try {
		return await readAs(marked ?? 'utf-8', source, options, watch);
	} catch (error) {
		if (!(error instanceof WrongEncoding)) throw error;
		if (marked)
			throw new Refusal('file-damaged', `The table is not in ${marked}, as it is marked.`);
		const layer = await readAs('windows-1252', source, options, watch);
		layer?.findings.push(guessed);
		return layer;
	}
}

const guessed: Finding = {
	code: 'encoding-guessed',
	severity: 'warning',
	message:
		'The file does not say how its names are written; they were read as windows-1252. Check letters with accents.',
	regions: [],
	at: null,
};

async function readAs(
	encoding: string,
	source: ByteSource,
	options: Options,
	watch: Watch,
): Promise<RawLayer | null> {
	const layout = await csvLayout(source, encoding);
	if (layout === null) return null;
	const layer = new RawLayer(options.limits, Math.min(Math.ceil(source.size / 32), 4_000_000));
	layer.format = 'CSV';
	layer.encoding = encoding === 'windows-1252' ? encoding : encoding.toUpperCase();
	layer.axesVary = true;
	if (layout.geometry.length > 1) layer.findings.push(severalShapes(layout));
	const reader = new RowReader(layout, layer);
	for await (const rows of csvRows(source, layout)) {
		if (watch.cancelled?.()) throw new Cancelled();
		watch.progress?.(`Reading rows (${layer.regions} so far)`, 0);
		for (const row of rows) reader.row(row);
	}
	return layer;
}

class RowReader {
	private rows = 0;
	private shapes = 0;
	private system: number | null = null;
	private attributes: number[];

	constructor(
		private layout: CsvLayout,
		private layer: RawLayer,
	) {
		this.attributes = [...layout.columns.keys()].filter((c) => !layout.geometry.includes(c));
	}

	row(values: string[]): void {
		const { columns, geometry, header } = this.layout;
		if (++this.rows === 1 && header) return;
		const place = `Row ${this.rows} of the table`;
		this.checkWidth(values, place);
		this.layer.startRegion();
		const shape = values[geometry[0]];
		if (shape.trim() !== '') this.checkSystem(readWkt(shape, this.layer, place), place);
		const cells = this.attributes.map((c) => [columns[c], values[c] === '' ? null : values[c]]);
		this.layer.table.add(null, Object.fromEntries(cells));
	}

	private checkWidth(values: string[], place: string): void {
		const width = this.layout.columns.length;
		const isFull = values.length >= width && values.slice(width).every((value) => value === '');
		if (isFull) return;
		const message = `${place} has ${values.length} values, but there are ${width} columns.`;
		throw new Refusal(values.length < width ? 'file-truncated' : 'file-damaged', message);
	}

	private checkSystem(system: number | null, place: string): void {
		if (this.shapes++ > 0 && this.system !== system) {
			const named = (n: number | null) => (n === null ? 'no system' : `the system EPSG:${n}`);
			const message = `${place} names ${named(system)}, but the rows before it ${named(this.system)}.`;
			throw new Refusal('file-damaged', message);
		}
		this.system = system;
		this.layer.crs = system === null ? null : `EPSG:${system}`;
	}
}

function severalShapes({ columns, geometry }: CsvLayout): Finding {
	const [read, ...others] = geometry.map((c) => columns[c]);
	const message = `Several columns hold geometry; "${read}" was read, not ${others.join(', ')}.`;
	return { code: 'several-geometries', severity: 'note', message, regions: [], at: null };
}
