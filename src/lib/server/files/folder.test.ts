import { createHash } from 'node:crypto';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { folderStore } from './folder.ts';
import { FileMissing } from './store.ts';

let root: string;
beforeAll(async () => {
	root = await mkdtemp(join(tmpdir(), 'merestone-files-'));
});
afterAll(() => rm(root, { recursive: true, force: true }));

const incoming = () => readdir(join(root, 'incoming'));

describe('a folder of files', () => {
	it('names the bytes by SHA-256 and gives them back', async () => {
		// FIPS 180-4 example: the digest of "abc"
		const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';
		const store = folderStore(root);
		const received = await store.receive(Readable.from([Buffer.from('a'), Buffer.from('bc')]));
		expect(received).toMatchObject({ digest: abc, bytes: 3 });
		expect(await store.has(abc)).toBe(false);
		await received.keep();
		const { stream, bytes } = await store.open(abc);
		expect(bytes).toBe(3);
		expect(String(await buffer(stream))).toBe('abc');
		expect(await incoming()).toEqual([]);
	});

	it('keeps equal bytes once and forgets them when told', async () => {
		const store = folderStore(root);
		const digest = createHash('sha256').update('twice').digest('hex');
		for (let turn = 0; turn < 2; turn++) {
			const received = await store.receive(Readable.from([Buffer.from('twice')]));
			await received.keep();
		}
		expect(await readdir(join(root, digest.slice(0, 2)))).toEqual([digest]);
		await store.delete(digest);
		await store.delete(digest);
		await expect(store.open(digest)).rejects.toBeInstanceOf(FileMissing);
	});

	it('leaves nothing behind when the sender breaks off or the bytes are discarded', async () => {
		const store = folderStore(root);
		const broken = Readable.from(
			(function* () {
				yield Buffer.from('half');
				throw new Error('the line went dead');
			})(),
		);
		await expect(store.receive(broken)).rejects.toThrow('the line went dead');
		await (await store.receive(Readable.from([Buffer.from('unwanted')]))).discard();
		expect(await incoming()).toEqual([]);
	});

	it('never lets a digest name another path', async () => {
		const store = folderStore(root);
		await expect(store.open('../../etc/passwd')).rejects.toBeInstanceOf(FileMissing);
		await expect(store.open('A'.repeat(64))).rejects.toBeInstanceOf(FileMissing);
	});
});
