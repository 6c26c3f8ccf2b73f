/** One ten-millionth of a degree: about 1.1 cm of latitude, and less of longitude. */
export const gridPerDegree = 1e7;

/** A slot holds a vertex number from 1 in its low bits and a piece of the hash above them. */
const numberBits = 26;
const numberMask = 2 ** numberBits - 1;

/** Slots of a group, less one; steps of a line that one tile should hold; slots tried in a group. */
const inGroup = 511;
const stepsInTile = 48;
const mostInGroup = 16;

/**
 * Vertices on the 1 cm grid: every position that rounds to the same grid cell is one vertex. The vertex
 * keeps the position as written; of several in a cell the least, so that the order of features is nothing.
 *
 * Each border is walked twice, mostly backwards the second time, so the next vertex is nearly always the
 * neighbour by number of the one before, written with the same digits: that is looked at first, the hash
 * only when it fails. Cells are not kept but worked out again, which happens seldom and saves memory.
 *
 * The hash sends a tile of the map to one group of slots, so that a line being walked stays in memory that
 * was just used; where a group is crowded the slot is looked for in the whole table.
 */
export class VertexTable {
	/** longitude and latitude of each vertex, interleaved */
	positions: Float64Array;
	count = 0;
	private slots: Int32Array;
	private previous = 0;
	/** tiles are two to this power of grid cells wide */
	private tile: number;

	/**
	 * `west`: the least longitude that will be asked for; longitudes span at most 429 degrees.
	 * `expected`: how many vertices there will be, about; at most 67 million can be told apart.
	 * `step`: how far apart two vertices of an outline mostly are, in degrees; only speed depends on it.
	 * `memory`: where the positions are to stand, if given: that of the points that are asked for in turn
	 * will do, since no more vertices are known at any time than points were asked for.
	 */
	constructor(
		private west: number,
		expected: number,
		step: number,
		memory?: Float64Array,
	) {
		const capacity = Math.max(1024, expected);
		this.positions = memory ?? new Float64Array(2 * capacity);
		this.slots = new Int32Array(2 ** Math.ceil(Math.log2(capacity * 1.25)));
		const cells = Math.max(1, step * gridPerDegree * stepsInTile);
		this.tile = Math.min(31, Math.round(Math.log2(cells)));
	}

	/** The number of the vertex at a position, new or known. */
	at(lon: number, lat: number): number {
		const { positions, previous } = this;
		const k = 2 * previous;
		if (k > 0 && positions[k - 2] === lon && positions[k - 1] === lat) {
			return (this.previous = previous - 1);
		}
		if (previous + 1 < this.count && positions[k + 2] === lon && positions[k + 3] === lat) {
			return (this.previous = previous + 1);
		}
		return (this.previous = this.hashed(lon, lat));
	}

	private hashed(lon: number, lat: number): number {
		const x = this.column(lon);
		const y = row(lat);
		const hash = hashOf(x, y);
		const tag = hash & ~numberMask;
		const { slots } = this;
		const group = this.groupOf(x, y);
		let slot = group | (hash & inGroup);
		for (let tries = 0; slots[slot] !== 0; tries++) {
			const held = slots[slot];
			if ((held & ~numberMask) === tag) {
				const v = (held & numberMask) - 1;
				if (this.isAt(v, x, y)) return this.seen(v, lon, lat);
			}
			if (tries < mostInGroup) slot = group | ((slot + 1) & inGroup);
			else if (tries === mostInGroup) slot = Math.imul(hash, 0x297a2d39) & (slots.length - 1);
			else slot = (slot + 1) & (slots.length - 1);
		}
		if (this.count * 2 === this.positions.length || this.count > 0.8 * slots.length) {
			this.grow();
			return this.hashed(lon, lat);
		}
		return this.put(slot, tag, lon, lat);
	}

	private put(slot: number, tag: number, lon: number, lat: number): number {
		const v = this.count++;
		this.slots[slot] = tag | (v + 1);
		this.positions[2 * v] = lon;
		this.positions[2 * v + 1] = lat;
		return v;
	}

	/** The memory of the hash, once no more vertices will be asked for. */
	memory(): Int32Array {
		return this.slots;
	}

	private isAt(v: number, x: number, y: number): boolean {
		return this.column(this.positions[2 * v]) === x && row(this.positions[2 * v + 1]) === y;
	}

	private groupOf(x: number, y: number): number {
		return hashOf(x >>> this.tile, y >>> this.tile) & (this.slots.length - 1) & ~inGroup;
	}

	private column(lon: number): number {
		return Math.round((lon - this.west) * gridPerDegree);
	}

	private seen(v: number, lon: number, lat: number): number {
		const { positions } = this;
		const x = positions[2 * v];
		if (lon < x || (lon === x && lat < positions[2 * v + 1])) {
			positions[2 * v] = lon;
			positions[2 * v + 1] = lat;
		}
		return v;
	}

	private grow(): void {
		const { positions, count } = this;
		if (count > numberMask / 2) throw new RangeError('too many vertices for one table');
		this.slots = new Int32Array(this.slots.length * 2);
		if (2 * count === positions.length) {
			this.positions = new Float64Array(4 * count + 128);
			this.positions.set(positions);
		}
		this.count = 0;
		for (let v = 0; v < count; v++) this.hashed(positions[2 * v], positions[2 * v + 1]);
	}
}

const row = (lat: number) => Math.round((lat + 90) * gridPerDegree);

function hashOf(x: number, y: number): number {
	const mixed = Math.imul(x, 0x9e3779b1) ^ Math.imul(y, 0x85ebca6b);
	return Math.imul(mixed ^ (mixed >>> 15), 0x2c1b3c6d);
}
