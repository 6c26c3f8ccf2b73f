import { createHash } from 'node:crypto';
import { mkdtemp, readdir, readFile, rm, utimes } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fakeObjectStore } from '../../../../tests/support/object-store.ts';
import { folderStore } from './folder.ts';
import { s3Store } from './s3.ts';
import { FileMissing, type FileStore } from './store.ts';

interface Case {
	store: FileStore;
	/** what is kept, by digest */
	kept(): Promise<string[]>;
	/** what is on its way, wherever it lies */
	incoming(): Promise<string[]>;
	/** has whatever is on its way look as if it had been there for a day and an hour */
	age(): Promise<void>;
	close(): Promise<void>;
}

const temporary = () => mkdtemp(join(tmpdir(), 'merestone-files-'));
const namesIn = (folder: string): Promise<string[]> =>
	readdir(folder).catch((error: NodeJS.ErrnoException) => {
		if (error.code === 'ENOENT') return [];
		throw error;
	});

async function ageAll(folder: string): Promise<void> {
	const past = new Date(Date.now() - 90_000_000);
	for (const name of await namesIn(folder)) await utimes(join(folder, name), past, past);
}

async function aFolder(): Promise<Case> {
	const root = await temporary();
	const spool = join(root, 'incoming');
	return {
		...{ store: folderStore(root), age: () => ageAll(spool), incoming: () => namesIn(spool) },
		async kept() {
			const all = await readdir(root, { recursive: true, withFileTypes: true });
			const files = all.filter((entry) => entry.isFile() && !entry.parentPath.endsWith('incoming'));
			return files.map(({ name }) => name).sort();
		},
		close: () => rm(root, { recursive: true, force: true }),
	};
}

async function aBucket(): Promise<Case> {
	const [fake, spool] = [await fakeObjectStore(), await temporary()];
	const isIncoming = (name: string) => name.startsWith('incoming');
	return {
		store: s3Store(fake.settings, spool),
		async age() {
			await ageAll(spool);
			await ageAll(join(fake.folder, 'incoming'));
		},
		kept: async () =>
			(await fake.objects()).filter((name) => !isIncoming(name)).map((name) => name.slice(3)),
		incoming: async () => [...(await fake.objects()).filter(isIncoming), ...(await namesIn(spool))],
		async close() {
			await fake.close();
			await rm(spool, { recursive: true, force: true });
		},
	};
}

const digestOf = (bytes: string | Buffer) => createHash('sha256').update(bytes).digest('hex');
const from = (...chunks: (string | Buffer)[]) =>
	Readable.from(chunks.map((chunk) => Buffer.from(chunk)));

/** What every store promises, asked of each. */
describe.each([
	['a folder of files', aFolder],
	['a bucket of a service', aBucket],
])('%s', (_name, make) => {
	let one: Case;
	beforeAll(async () => {
		one = await make();
	});
	afterAll(() => one.close());

	it('names the bytes by SHA-256 and gives them back', async () => {
		// FIPS 180-4 example: the digest of "abc"
		const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';
		const received = await one.store.receive(from('a', 'bc'));
		expect(received).toMatchObject({ digest: abc, bytes: 3 });
		expect(String(await readFile(received.path))).toBe('abc');
		expect(await one.store.has(abc)).toBe(false);
		await expect(one.store.open(abc)).rejects.toBeInstanceOf(FileMissing);
		await received.keep();
		await received.discard();
		expect(await one.store.has(abc)).toBe(true);
		const { stream, bytes } = await one.store.open(abc);
		expect(bytes).toBe(3);
		expect(String(await buffer(stream))).toBe('abc');
		expect(await one.incoming()).toEqual([]);
	});

	it('lends them to readers of this machine, whole', async () => {
		const text = 'to be read by path';
		await (await one.store.receive(from(text))).keep();
		const lent = await one.store.local(digestOf(text));
		expect(String(await readFile(lent.path))).toBe(text);
		await lent.release();
		expect(await one.store.has(digestOf(text))).toBe(true);
		expect(await one.incoming()).toEqual([]);
	});

	it('takes in more than one part of it, and nothing at all', async () => {
		const block = Buffer.alloc(1_000_000, 7);
		const large = await one.store.receive(from(...new Array<Buffer>(19).fill(block), 'end'));
		expect(large.bytes).toBe(19_000_003);
		await large.keep();
		const { stream, bytes } = await one.store.open(large.digest);
		expect(bytes).toBe(19_000_003);
		expect(digestOf(await buffer(stream))).toBe(large.digest);
		const empty = await one.store.receive(from());
		expect(empty).toMatchObject({ bytes: 0, digest: digestOf('') });
		await empty.discard();
		expect(await one.incoming()).toEqual([]);
	});

	it('keeps equal bytes once, were they sent at once, and forgets them when told', async () => {
		const digest = digestOf('twice');
		const both = await Promise.all([
			one.store.receive(from('twice')),
			one.store.receive(from('tw', 'ice')),
		]);
		await Promise.all(both.map((received) => received.keep()));
		expect((await one.kept()).filter((name) => name === digest)).toHaveLength(1);
		await one.store.delete(digest);
		await one.store.delete(digest);
		await expect(one.store.open(digest)).rejects.toBeInstanceOf(FileMissing);
		await expect(one.store.local(digest)).rejects.toBeInstanceOf(FileMissing);
		expect(await one.incoming()).toEqual([]);
	});

	it.each([10, 20_000_000])(
		'leaves nothing behind when the sender breaks off after %d bytes',
		async (bytes) => {
			const kept = await one.kept();
			const broken = Readable.from(
				(function* () {
					yield Buffer.alloc(bytes);
					throw new Error('the line went dead');
				})(),
			);
			await expect(one.store.receive(broken)).rejects.toThrow('the line went dead');
			await (await one.store.receive(from('unwanted'))).discard();
			expect(await one.incoming()).toEqual([]);
			expect(await one.kept()).toEqual(kept);
		},
	);

	it('never lets a digest name another path', async () => {
		for (const name of ['../../etc/passwd', 'A'.repeat(64), '', `${'a'.repeat(64)}/..`]) {
			await expect(one.store.open(name)).rejects.toBeInstanceOf(FileMissing);
			await expect(one.store.local(name)).rejects.toBeInstanceOf(FileMissing);
			await expect(one.store.delete(name)).rejects.toBeInstanceOf(FileMissing);
			expect(await one.store.has(name)).toBe(false);
		}
	});

	it('tidies away what a killed process left a day ago, and nothing younger', async () => {
		await one.store.receive(from('left by a killed process'));
		await one.age();
		const arriving = await one.store.receive(from('just arriving'));
		const all = await one.incoming();
		await one.store.tidy();
		expect((await one.incoming()).length).toBe(all.length / 2);
		await arriving.keep();
		expect(await one.store.has(arriving.digest)).toBe(true);
		expect(await one.incoming()).toEqual([]);
	});
});
