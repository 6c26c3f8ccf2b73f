import { readFileSync } from 'node:fs';
import { gunzipSync, gzipSync } from 'node:zlib';
import type { RawTable } from '../../engines/measures/index.ts';

/**
 * A table that was read, kept packed, so that no step of the review parses a workbook again: the table
 * without its cells as one line of JSON, then a line for every column. Each thread has the last one at hand.
 */
export interface KeptTable {
	/** where the packed table lies on this machine */
	path: string;
	/** its digest */
	digest: string;
}

const newline = 10;

export function packTable({ cells, ...rest }: RawTable): Uint8Array {
	const lines = [rest, ...cells].map((part) => Buffer.from(`${JSON.stringify(part)}\n`));
	return gzipSync(Buffer.concat(lines), { level: 1 });
}

let last: { digest: string; table: RawTable } | null = null;

export function unpackTable({ path, digest }: KeptTable): RawTable {
	if (last?.digest !== digest) {
		last = null;
		last = { digest, table: unpack(gunzipSync(readFileSync(path))) };
	}
	return last.table;
}

function unpack(bytes: Buffer): RawTable {
	const parts: unknown[] = [];
	for (let from = 0; from < bytes.length;) {
		const end = bytes.indexOf(newline, from);
		parts.push(JSON.parse(bytes.toString('utf8', from, end)));
		from = end + 1;
	}
	const [rest, ...cells] = parts as [Omit<RawTable, 'cells'>, ...RawTable['cells']];
	return { ...rest, cells };
}
