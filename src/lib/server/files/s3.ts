import { createHash } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { setTimeout } from 'node:timers/promises';
import {
	CopyObjectCommand,
	DeleteObjectCommand,
	GetObjectCommand,
	HeadObjectCommand,
	S3Client,
} from '@aws-sdk/client-s3';
import type { S3Settings } from '../config.ts';
import { asFilesAway, isMissing, type Bucket } from './s3-bucket.ts';
import { leave, receiveInto } from './s3-receive.ts';
import { tidyBucket } from './s3-tidy.ts';
import { Spool } from './spool.ts';
import {
	FilesAway,
	FileMissing,
	isDigest,
	requireDigest,
	type FileStore,
	type Received,
} from './store.ts';

/**
 * The store as a bucket of a service that speaks the S3 protocol: `incoming/` while bytes arrive, then
 * `ab/abcd...` by digest. What threads must read by path lies in `spool` on this machine meanwhile; no
 * other process needs it. Rejects with `FilesAway` whenever the service cannot be reached or refuses.
 */
export function s3Store(settings: S3Settings, spoolFolder: string): FileStore {
	const bucket: Bucket = { client: clientOf(settings), name: settings.bucket };
	const spool = new Spool(spoolFolder);
	return {
		receive: (source) => receive(bucket, spool, source),
		open: async (digest) => open(bucket, digest),
		local: (digest) => local(bucket, spool, digest),
		has: (digest) => has(bucket, digest),
		delete: async (digest) => remove(bucket, keyOf(digest)),
		async tidy() {
			await spool.tidy();
			await tidyBucket(bucket);
		},
	};
}

/** Checksums only where the protocol demands them: not every service knows the newer kinds. */
const clientOf = ({ endpoint, region, pathStyle, keyId, secret }: S3Settings): S3Client =>
	new S3Client({
		...{ endpoint, region, forcePathStyle: pathStyle },
		credentials: { accessKeyId: keyId, secretAccessKey: secret },
		requestChecksumCalculation: 'WHEN_REQUIRED',
		responseChecksumValidation: 'WHEN_REQUIRED',
		maxAttempts: 3,
		requestHandler: { connectionTimeout: 3_000, socketTimeout: 30_000 },
	});

const keyOf = (digest: string) => `${requireDigest(digest).slice(0, 2)}/${digest}`;

async function receive(bucket: Bucket, spool: Spool, source: Readable): Promise<Received> {
	const { digest, bytes, path, incoming } = await receiveInto(bucket, spool, source);
	let gone = false;
	const discard = async () => {
		if (gone) return;
		gone = true;
		await spool.remove(path);
		await leave(bucket, incoming);
	};
	const keep = async () => {
		await settle(bucket, incoming, keyOf(digest), bytes);
		await discard();
	};
	return { digest, bytes, path, keep, discard };
}

/** How often a copy is looked at before it is given up, each time after a longer wait. */
const looks = 6;

/**
 * The service copies by itself; the name by digest appears once the copy is whole. Some services show it
 * short for a moment while another sender keeps the same bytes, so that one look is not enough.
 */
async function settle(bucket: Bucket, from: string, to: string, bytes: number): Promise<void> {
	const { client, name: Bucket } = bucket;
	await asFilesAway(() =>
		client.send(new CopyObjectCommand({ Bucket, Key: to, CopySource: `${Bucket}/${from}` })),
	);
	let found: number | undefined;
	for (let look = 0; look < looks; look++) {
		if (look > 0) await setTimeout(10 * 2 ** look);
		const copied = await asFilesAway(() => client.send(new HeadObjectCommand({ Bucket, Key: to })));
		found = copied.ContentLength;
		if (found === bytes) return;
	}
	await remove(bucket, to);
	throw new FilesAway(`${found} of ${bytes} bytes were kept`);
}

async function open(
	{ client, name: Bucket }: Bucket,
	digest: string,
): Promise<{ stream: Readable; bytes: number }> {
	const Key = keyOf(digest);
	const found = await asFilesAway(
		() => client.send(new GetObjectCommand({ Bucket, Key })),
		() => new FileMissing(digest),
	);
	return { stream: found.Body as Readable, bytes: found.ContentLength ?? 0 };
}

/** Fetches the bytes to this machine and sees that they are what their name says. */
async function local(bucket: Bucket, spool: Spool, digest: string) {
	const { stream } = await open(bucket, digest);
	const path = await spool.place();
	const release = () => spool.remove(path);
	try {
		await asFilesAway(() => pipeline(stream, createWriteStream(path, { mode: 0o600 })));
		const hash = createHash('sha256');
		await pipeline(createReadStream(path), hash);
		if (hash.digest('hex') !== digest) throw new FilesAway('the bytes are not those of their name');
		return { path, release };
	} catch (error) {
		await release();
		throw error;
	}
}

async function has({ client, name: Bucket }: Bucket, digest: string): Promise<boolean> {
	if (!isDigest(digest)) return false;
	try {
		await client.send(new HeadObjectCommand({ Bucket, Key: keyOf(digest) }));
		return true;
	} catch (problem) {
		if (isMissing(problem)) return false;
		throw FilesAway.because(problem);
	}
}

const remove = async ({ client, name: Bucket }: Bucket, Key: string): Promise<void> => {
	await asFilesAway(() => client.send(new DeleteObjectCommand({ Bucket, Key })));
};
