import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';

/** Names of the geometry codes of ISO 13249-3 (and OGC 06-103r4, table 7), heights and measures aside. */
const names: Record<number, string> = {
	1: 'Point',
	2: 'LineString',
	3: 'Polygon',
	4: 'MultiPoint',
	5: 'MultiLineString',
	6: 'MultiPolygon',
	7: 'GeometryCollection',
	8: 'CircularString',
	9: 'CompoundCurve',
	10: 'CurvePolygon',
	11: 'MultiCurve',
	12: 'MultiSurface',
	13: 'Curve',
	14: 'Surface',
	15: 'PolyhedralSurface',
	16: 'TIN',
	17: 'Triangle',
};
const deepest = 8;

/**
 * Well-known binary (OGC 06-103r4, clause 8; ISO codes for heights and measures, which are passed over).
 * Areas go into the layer, points and lines are counted. Every count is held against the bytes that are
 * left before anything is read; curves are refused by name.
 */
export class Wkb {
	private at = 0;
	private little = true;
	private view: DataView;

	/** `place`: what the bytes belong to, for messages, such as `Feature 3`. */
	constructor(
		bytes: Uint8Array,
		private layer: RawLayer,
		private place: string,
	) {
		this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	}

	/** The one geometry that the bytes are; bytes after it are refused. */
	read(): void {
		this.geometry(0);
		const left = this.view.byteLength - this.at;
		if (left) throw this.damaged(`${left} bytes follow the end of its geometry`);
	}

	private geometry(level: number, within?: string): void {
		if (level > deepest) throw this.damaged(`its geometries nest deeper than ${deepest} levels`);
		this.need(1, 5, 'geometry');
		const order = this.view.getUint8(this.at++);
		if (order > 1) throw this.damaged(`its byte order is ${order}`);
		this.little = order === 1;
		const code = this.uint();
		const kind = names[code % 1000];
		const dimensions = [2, 3, 3, 4][Math.floor(code / 1000)];
		if (!kind || !dimensions) throw this.damaged(`${code} is no kind of geometry`);
		if (within && within !== kind) throw this.damaged(`a ${within} holds a ${kind}`);
		this.body(kind, dimensions, level);
	}

	private body(kind: string, dimensions: number, level: number): void {
		if (kind === 'Polygon' || kind === 'Triangle') return this.polygon(dimensions);
		if (kind === 'MultiPolygon') return this.members(level, 'Polygon');
		if (kind === 'GeometryCollection' || kind === 'MultiSurface') return this.members(level);
		if (kind === 'Point' || kind === 'LineString') {
			this.layer.stray(kind);
			const points = kind === 'Point' ? 1 : this.count(8 * dimensions, 'points');
			this.need(points, 8 * dimensions, 'points');
			this.at += points * 8 * dimensions;
		} else if (kind === 'MultiPoint' || kind === 'MultiLineString') {
			this.members(level, kind.slice(5));
		} else {
			const message = `${this.place} is a ${kind}; curves and surfaces in space are not read. Turn it into polygons first.`;
			throw new Refusal('unsupported-format', message);
		}
	}

	private members(level: number, within?: string): void {
		for (let left = this.count(5, 'geometries'); left > 0; left--) this.geometry(level + 1, within);
	}

	private polygon(dimensions: number): void {
		const rings = this.count(4, 'rings');
		if (rings === 0) return;
		this.layer.startPart();
		for (let ring = 0; ring < rings; ring++) {
			this.layer.startRing();
			for (let left = this.count(8 * dimensions, 'points'); left > 0; left--) {
				const x = this.view.getFloat64(this.at, this.little);
				const y = this.view.getFloat64(this.at + 8, this.little);
				if (!Number.isFinite(x) || !Number.isFinite(y)) {
					const message = `${this.place} has the position ${x}, ${y}, which is not two numbers.`;
					throw new Refusal('bad-coordinate', message);
				}
				this.layer.point(x, y);
				this.at += 8 * dimensions;
			}
		}
	}

	private count(bytesEach: number, of: string): number {
		this.need(1, 4, of);
		const count = this.uint();
		this.need(count, bytesEach, of);
		return count;
	}

	private uint(): number {
		const value = this.view.getUint32(this.at, this.little);
		this.at += 4;
		return value;
	}

	private need(count: number, bytesEach: number, of: string): void {
		const left = this.view.byteLength - this.at;
		if (count * bytesEach > left) {
			throw this.damaged(`its geometry declares ${count} ${of} but only ${left} bytes follow`);
		}
	}

	private damaged(what: string): Refusal {
		return new Refusal('file-damaged', `${this.place} cannot be read: ${what}.`);
	}
}
