import type { Cell } from '../attribute-table.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { kmlPositions } from './kml-text.ts';

/** What may stand outermost; old files lack the `kml` around it. */
const roots = new Set(['kml', 'Document', 'Folder', 'Placemark']);
const strays = new Set(['Point', 'LineString', 'LinearRing', 'Track', 'Model']);
const numeric = new Set(['int', 'uint', 'short', 'ushort', 'float', 'double']);

interface Placemark {
	id: string | null;
	name: string | null;
	description: string | null;
	data: Map<string, string>;
}

/** Takes elements as they open and close, and puts the areas of placemarks into the layer. */
export class KmlFeatures {
	/** how many elements and texts there were */
	taken = 0;
	private stack: string[] = [];
	private words = '';
	private placemark: Placemark | null = null;
	private polygon: { outer: number[]; inner: number[][] }[] | null = null;
	private folders: string[] = [];
	/** kinds of the columns that a Schema declares */
	private kinds = new Map<string, string>();
	private column = '';
	private links = 0;

	constructor(
		private layer: RawLayer,
		private deepest: number,
	) {}

	place(): string {
		return this.placemark ? `feature ${this.layer.regions}` : `after feature ${this.layer.regions}`;
	}

	open(name: string, attributes: Record<string, string>): void {
		const { stack } = this;
		this.taken++;
		if (stack.length === 0 && !roots.has(name)) {
			const message = `The file is XML but not KML: its outermost element is "${name.slice(0, 40)}".`;
			throw new Refusal('unsupported-format', message);
		}
		if (stack.length >= this.deepest) {
			throw this.damaged(`it nests deeper than ${this.deepest} elements`);
		}
		stack.push(name);
		this.words = '';
		if (name === 'Folder') this.folders.push('');
		else if (name === 'NetworkLink') this.links++;
		else if (name === 'Placemark') this.startPlacemark(attributes.id ?? null);
		else if (name === 'Data' || name === 'SimpleData') this.column = attributes.name ?? '';
		else if (name === 'SimpleField') this.kinds.set(attributes.name ?? '', attributes.type ?? '');
		else if (this.placemark) this.openShape(name);
	}

	text(text: string): void {
		this.taken++;
		this.words += text;
	}

	close(name: string): void {
		const { stack, placemark } = this;
		this.taken++;
		stack.pop();
		const parent = stack[stack.length - 1];
		const words = this.words;
		this.words = '';
		if (name === 'Folder') this.folders.pop();
		else if (name === 'name') this.named(parent, words.trim());
		else if (name === 'Placemark') this.endPlacemark();
		else if (!placemark) return;
		else if (name === 'description' && parent === 'Placemark') placemark.description = words.trim();
		else if (name === 'SimpleData' || (name === 'value' && parent === 'Data')) {
			if (this.column) placemark.data.set(this.column, words.trim());
		} else if (name === 'coordinates') this.endCoordinates(words);
		else if (name === 'Polygon') this.endPolygon();
	}

	/** Once the file is at its end. */
	end(): void {
		if (this.links === 0) return;
		const message = `The file points to ${this.links} other files, which were not read.`;
		const { findings } = this.layer;
		findings.push({
			code: 'link-not-followed',
			severity: 'warning',
			message,
			regions: [],
			at: null,
		});
	}

	private named(parent: string, words: string): void {
		if (parent === 'Placemark' && this.placemark) this.placemark.name = words;
		else if (parent === 'Folder') this.folders[this.folders.length - 1] = words;
		else if (parent === 'Document') this.layer.layer ??= words || null;
	}

	private startPlacemark(id: string | null): void {
		if (this.placemark) throw this.damaged('a Placemark stands inside a Placemark');
		this.layer.startRegion();
		this.placemark = { id, name: null, description: null, data: new Map() };
	}

	private endPlacemark(): void {
		const { id, name, description, data } = this.placemark as Placemark;
		const row = new Map<string, Cell>([['name', name]]);
		for (const [column, value] of data) row.set(column, this.cell(column, value));
		const folder = this.folders.filter(Boolean).join(' / ');
		if (folder && !row.has('folder')) row.set('folder', folder);
		if (description && !row.has('description')) row.set('description', description);
		this.layer.table.add(id, Object.fromEntries(row));
		this.placemark = null;
	}

	private cell(column: string, value: string): Cell {
		if (value === '') return null;
		if (!numeric.has(this.kinds.get(column) ?? '')) return value;
		const number = Number(value);
		const isExact = /^-?\d+$/.test(value) ? Number.isSafeInteger(number) : Number.isFinite(number);
		return isExact ? number : value;
	}

	private openShape(name: string): void {
		if (name === 'Polygon') {
			if (this.polygon) throw this.damaged('a Polygon stands inside a Polygon');
			this.polygon = [];
		} else if (!this.polygon && strays.has(name)) {
			this.layer.stray(name);
		}
	}

	private endCoordinates(words: string): void {
		const { polygon, stack } = this;
		if (!polygon) return;
		const side = stack[stack.length - 2];
		const ring = kmlPositions(words, `Feature ${this.layer.regions}`);
		if (side === 'outerBoundaryIs') polygon.push({ outer: ring, inner: [] });
		else if (side !== 'innerBoundaryIs') throw this.damaged('a ring of a Polygon has no side');
		else if (polygon.length) polygon[polygon.length - 1].inner.push(ring);
		else throw this.damaged('an inner boundary stands before the outer one');
	}

	private endPolygon(): void {
		const { layer } = this;
		for (const { outer, inner } of this.polygon ?? []) {
			layer.startPart();
			for (const ring of [outer, ...inner]) {
				layer.startRing();
				for (let i = 0; i < ring.length; i += 2) layer.point(ring[i], ring[i + 1]);
			}
		}
		this.polygon = null;
	}

	private damaged(what: string): Refusal {
		return new Refusal('file-damaged', `The KML cannot be read: ${what} (${this.place()}).`);
	}
}
