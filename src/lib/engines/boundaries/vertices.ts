/** One ten-millionth of a degree: about 1.1 cm of latitude, and less of longitude. */
export const gridPerDegree = 1e7;

/**
 * Vertices on the 1 cm grid: every position that rounds to the same grid cell is one vertex. The vertex
 * keeps the position as written; of several in a cell the least, so that the order of features is nothing.
 *
 * Each border is walked twice, mostly backwards the second time, so the next vertex is nearly always the
 * neighbour by number of the one before: that is looked at first, the hash only when it fails.
 */
export class VertexTable {
	/** longitude and latitude of each vertex, interleaved */
	positions: Float64Array;
	count = 0;
	private cellX: Uint32Array;
	private cellY: Uint32Array;
	private slots: Int32Array;
	private mask: number;
	private previous = 0;

	/** `west`: the least longitude that will be asked for; longitudes span at most 429 degrees. */
	constructor(
		private west: number,
		expected: number,
	) {
		const capacity = Math.max(64, expected);
		this.positions = new Float64Array(2 * capacity);
		this.cellX = new Uint32Array(capacity);
		this.cellY = new Uint32Array(capacity);
		this.slots = new Int32Array(2 ** Math.ceil(Math.log2(capacity * 2))).fill(-1);
		this.mask = this.slots.length - 1;
	}

	/** The number of the vertex at a position, new or known. */
	at(lon: number, lat: number): number {
		const x = Math.round((lon - this.west) * gridPerDegree);
		const y = Math.round((lat + 90) * gridPerDegree);
		const { cellX, cellY, previous } = this;
		if (previous > 0 && cellX[previous - 1] === x && cellY[previous - 1] === y) {
			return this.seen(previous - 1, lon, lat);
		}
		if (previous + 1 < this.count && cellX[previous + 1] === x && cellY[previous + 1] === y) {
			return this.seen(previous + 1, lon, lat);
		}
		return this.hashed(x, y, lon, lat);
	}

	private hashed(x: number, y: number, lon: number, lat: number): number {
		let slot = (Math.imul(x, 0x9e3779b1) ^ Math.imul(y, 0x85ebca6b)) >>> 0;
		slot = (slot ^ (slot >>> 15)) & this.mask;
		for (let v = this.slots[slot]; v >= 0; v = this.slots[slot]) {
			if (this.cellX[v] === x && this.cellY[v] === y) return this.seen(v, lon, lat);
			slot = (slot + 1) & this.mask;
		}
		if (this.count === this.cellX.length) {
			this.grow();
			return this.hashed(x, y, lon, lat);
		}
		const v = this.count++;
		this.slots[slot] = v;
		this.cellX[v] = x;
		this.cellY[v] = y;
		this.positions[2 * v] = lon;
		this.positions[2 * v + 1] = lat;
		return (this.previous = v);
	}

	private seen(v: number, lon: number, lat: number): number {
		const { positions } = this;
		const x = positions[2 * v];
		if (lon < x || (lon === x && lat < positions[2 * v + 1])) {
			positions[2 * v] = lon;
			positions[2 * v + 1] = lat;
		}
		return (this.previous = v);
	}

	private grow(): void {
		const bigger = new VertexTable(this.west, this.count * 2);
		for (let v = 0; v < this.count; v++) {
			let slot =
				(Math.imul(this.cellX[v], 0x9e3779b1) ^ Math.imul(this.cellY[v], 0x85ebca6b)) >>> 0;
			slot = (slot ^ (slot >>> 15)) & bigger.mask;
			while (bigger.slots[slot] >= 0) slot = (slot + 1) & bigger.mask;
			bigger.slots[slot] = v;
		}
		bigger.positions.set(this.positions);
		bigger.cellX.set(this.cellX);
		bigger.cellY.set(this.cellY);
		const { positions, cellX, cellY, slots, mask } = bigger;
		Object.assign(this, { positions, cellX, cellY, slots, mask });
	}
}
