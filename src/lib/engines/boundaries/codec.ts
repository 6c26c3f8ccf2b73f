import { strFromU8, strToU8, unzlibSync, zlibSync } from 'fflate';
import type { Coverage } from './coverage.ts';

const magic = 0x4d455243;
const version = 1;
const headerBytes = 16;
/** the most that a stored coverage may unpack to */
const mostBytes = 2 ** 31 - 1;

const columns = [
	['arcPoints', Float64Array],
	['arcMetres', Float64Array],
	['areasKm2', Float64Array],
	['arcStarts', Uint32Array],
	['arcLeft', Int32Array],
	['arcRight', Int32Array],
	['ringArcs', Int32Array],
	['ringStarts', Uint32Array],
	['partRings', Uint32Array],
	['regionParts', Uint32Array],
	['enclaveOf', Int32Array],
] as const;

/**
 * A coverage as bytes: sixteen of header (magic, version, unpacked length, length of the text), then a
 * zlib stream of the lengths of the columns, the columns themselves and the keys and names as JSON.
 * Numbers are little-endian doubles and 32-bit integers; nothing is rounded.
 */
export function encodeCoverage(coverage: Coverage): Uint8Array {
	const text = strToU8(JSON.stringify([coverage.keys, coverage.names]));
	const lengths = columns.map(([name]) => coverage[name].length);
	let size = align8(4 * columns.length) + text.length;
	for (const [name, Kind] of columns)
		size += align8(coverage[name].length * Kind.BYTES_PER_ELEMENT);
	const body = new Uint8Array(size);
	body.set(new Uint8Array(Uint32Array.from(lengths).buffer), 0);
	let at = align8(4 * columns.length);
	for (const [name] of columns) {
		const column = coverage[name];
		body.set(new Uint8Array(column.buffer, column.byteOffset, column.byteLength), at);
		at += align8(column.byteLength);
	}
	body.set(text, at);
	const packed = zlibSync(body, { level: 4 });
	const bytes = new Uint8Array(headerBytes + packed.length);
	const header = new DataView(bytes.buffer);
	[magic, version, size, text.length].forEach((n, i) => header.setUint32(4 * i, n, true));
	bytes.set(packed, headerBytes);
	return bytes;
}

/**
 * The coverage in bytes that `encodeCoverage` made. Throws a RangeError that says what is wrong when
 * they are of another version, cut off or altered so that the columns do not fit together.
 */
export function decodeCoverage(bytes: Uint8Array): Coverage {
	if (bytes.length < headerBytes) throw new RangeError('The coverage is cut off in its header.');
	const header = new DataView(bytes.buffer, bytes.byteOffset, headerBytes);
	const [found, made, size, textBytes] = [0, 4, 8, 12].map((at) => header.getUint32(at, true));
	if (found !== magic) throw new RangeError('These bytes are not a coverage.');
	if (made !== version) throw new RangeError(`The coverage is of version ${made}, not ${version}.`);
	if (size > mostBytes || textBytes > size)
		throw new RangeError('The coverage tells a wrong length.');
	const body = unpacked(bytes.subarray(headerBytes), size);
	return fromBody(body, textBytes);
}

function unpacked(packed: Uint8Array, size: number): Uint8Array {
	let body: Uint8Array;
	try {
		body = unzlibSync(packed, { out: new Uint8Array(size) });
	} catch (error) {
		throw new RangeError('The coverage is damaged.', { cause: error });
	}
	if (body.length !== size) throw new RangeError('The coverage is cut off.');
	return body;
}

function fromBody(body: Uint8Array, textBytes: number): Coverage {
	const start = align8(4 * columns.length);
	if (body.length < start) throw new RangeError('The coverage is cut off.');
	const lengths = new Uint32Array(body.slice(0, 4 * columns.length).buffer);
	const read: Record<string, unknown> = {};
	let at = start;
	columns.forEach(([name, Kind], i) => {
		const size = lengths[i] * Kind.BYTES_PER_ELEMENT;
		if (at + size > body.length) throw new RangeError(`The coverage is cut off in ${name}.`);
		read[name] = new Kind(body.slice(at, at + size).buffer);
		at += align8(size);
	});
	if (at + textBytes !== body.length) throw new RangeError('The coverage is cut off in its keys.');
	const [keys, names] = JSON.parse(strFromU8(body.subarray(at))) as [string[], string[]];
	const coverage = { keys, names, ...read } as Coverage;
	checkBounds(coverage);
	return coverage;
}

/** What must hold so that no later reader runs out of an array; the rest is for `coverageFaults`. */
function checkBounds(c: Coverage): void {
	const arcs = c.arcLeft.length;
	const regions = c.keys.length;
	const fits =
		isStarts(c.arcStarts, arcs, c.arcPoints.length / 2) &&
		isStarts(c.ringStarts, c.ringStarts.length - 1, c.ringArcs.length) &&
		isStarts(c.partRings, c.partRings.length - 1, c.ringStarts.length - 1) &&
		isStarts(c.regionParts, regions, c.partRings.length - 1) &&
		[c.arcRight, c.arcMetres].every((column) => column.length === arcs) &&
		[c.names, c.areasKm2, c.enclaveOf].every((column) => column.length === regions) &&
		c.ringArcs.every((half) => (half >= 0 ? half : ~half) < arcs) &&
		[c.arcLeft, c.arcRight, c.enclaveOf].every((column) =>
			column.every((r) => r >= -1 && r < regions),
		);
	if (!fits) throw new RangeError('The columns of the coverage do not fit together.');
}

function isStarts(starts: Uint32Array, count: number, total: number): boolean {
	if (starts.length !== count + 1 || starts[0] !== 0 || starts[count] !== total) return false;
	for (let i = 0; i < count; i++) if (starts[i] > starts[i + 1]) return false;
	return true;
}

const align8 = (bytes: number) => Math.ceil(bytes / 8) * 8;
