import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, it } from 'vitest';
import type { ByteReader } from '../../engines/boundaries/index.ts';
import { fileSource } from './file-source.ts';

const folder = mkdtempSync(join(tmpdir(), 'file-source-'));
afterAll(() => rmSync(folder, { recursive: true }));

const bytes = Uint8Array.from({ length: 2_500_000 }, (_, i) => (i * 2654435761) >>> 24);

async function allOf(reader: ByteReader, helping: number): Promise<Buffer> {
	const parts: Buffer[] = [];
	for (;;) {
		const memory = Buffer.alloc(helping);
		const length = await reader.read(memory);
		if (length === 0) break;
		parts.push(memory.subarray(0, length));
	}
	await reader.close();
	return Buffer.concat(parts);
}

it.each([300_001, 1 << 20, 3_000_000])(
	'reads a file whole, %i bytes asked for',
	async (helping) => {
		const path = join(folder, 'bytes');
		writeFileSync(path, bytes);
		const reader = fileSource(path, 'bytes').reader?.() as ByteReader;
		expect((await allOf(reader, helping)).equals(bytes)).toBe(true);
	},
);

it('tells who reads that there is no file, and can be closed all the same', async () => {
	const path = join(folder, 'gone');
	writeFileSync(path, '');
	const source = fileSource(path, 'gone');
	rmSync(path);
	const reader = source.reader?.() as ByteReader;
	await expect(reader.read(new Uint8Array(9))).rejects.toThrow('ENOENT');
	await reader.close();
});
