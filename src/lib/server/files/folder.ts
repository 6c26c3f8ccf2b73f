import { createHash } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { access, mkdir, open, rename, rm, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { Transform, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { Spool } from './spool.ts';
import { FileMissing, isDigest, requireDigest, type FileStore, type Received } from './store.ts';

/** The store as a folder on disk: `incoming/` while bytes arrive, then `ab/abcd...` by digest. */
export function folderStore(root: string): FileStore {
	const place = (digest: string) => join(root, requireDigest(digest).slice(0, 2), digest);
	return {
		receive: (source) => receive(root, place, source),
		async open(digest) {
			const path = place(digest);
			const bytes = await sizeOf(path, digest);
			return { stream: createReadStream(path), bytes };
		},
		async local(digest) {
			const path = place(digest);
			await sizeOf(path, digest);
			return { path, release: async () => undefined };
		},
		has: async (digest) => isDigest(digest) && isThere(place(digest)),
		delete: async (digest) => rm(place(digest), { force: true }),
		tidy: () => new Spool(join(root, 'incoming')).tidy(),
	};
}

const isThere = (path: string): Promise<boolean> =>
	access(path).then(
		() => true,
		() => false,
	);

async function sizeOf(path: string, digest: string): Promise<number> {
	try {
		return (await stat(path)).size;
	} catch (cause) {
		throw Object.assign(new FileMissing(digest), { cause });
	}
}

async function receive(
	root: string,
	place: (digest: string) => string,
	source: Readable,
): Promise<Received> {
	const spool = new Spool(join(root, 'incoming'));
	const path = await spool.place();
	const hash = createHash('sha256');
	let bytes = 0;
	const digesting = new Transform({
		transform(chunk: Buffer, _encoding, done) {
			hash.update(chunk);
			bytes += chunk.length;
			done(null, chunk);
		},
	});
	const discard = () => spool.remove(path);
	try {
		await pipeline(source, digesting, createWriteStream(path, { mode: 0o600 }));
	} catch (error) {
		await discard();
		throw error;
	}
	const digest = hash.digest('hex');
	return { digest, bytes, path, discard, keep: () => settle(path, place(digest)) };
}

/** Moves a received file to its place; it is on the disk, name and all, when this resolves. */
async function settle(from: string, to: string): Promise<void> {
	await mkdir(dirname(to), { recursive: true, mode: 0o700 });
	await flush(from);
	await rename(from, to);
	await flush(dirname(to));
}

async function flush(path: string): Promise<void> {
	const handle = await open(path, 'r');
	try {
		await handle.sync();
	} finally {
		await handle.close();
	}
}
