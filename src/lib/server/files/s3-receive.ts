import { createHash, randomUUID } from 'node:crypto';
import { once } from 'node:events';
import { createWriteStream } from 'node:fs';
import { PassThrough, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { DeleteObjectCommand } from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { log } from '../log.ts';
import type { Bucket } from './s3-bucket.ts';
import type { Spool } from './spool.ts';
import { FilesAway } from './store.ts';

export interface Arrived {
	digest: string;
	bytes: number;
	/** on this machine */
	path: string;
	/** name of the object until it is kept */
	incoming: string;
}

/** name under which bytes arrive */
export const incomingPrefix = 'incoming/';

/** Parts of an upload, in bytes; the protocol asks for 5 MiB at least. */
const partSize = 8 * 2 ** 20;

/**
 * Sends bytes on to the bucket as they arrive, digests them, and lays them down on this machine too.
 * Rejects with what `source` fails with, or with `FilesAway`, having left nothing behind.
 */
export async function receiveInto(
	bucket: Bucket,
	spool: Spool,
	source: Readable,
): Promise<Arrived> {
	const incoming = `${incomingPrefix}${randomUUID()}`;
	const path = await spool.place();
	const sending = send(bucket, incoming);
	try {
		const { digest, bytes } = await tee(source, path, sending);
		return { digest, bytes, path, incoming };
	} catch (error) {
		const lost = sending.body.destroyed || sending.lost.signal.aborted;
		await giveUp(bucket, incoming, sending);
		await spool.remove(path);
		throw lost ? FilesAway.because(sending.fault ?? error) : error;
	}
}

interface Sending {
	body: PassThrough;
	done: Promise<unknown>;
	/** fires when the service is lost, so that nobody waits for it to take more */
	lost: AbortController;
	fault?: unknown;
}

function send({ client, name: Bucket }: Bucket, Key: string): Sending {
	const body = new PassThrough();
	const upload = new Upload({
		...{ client, partSize, queueSize: 2, leavePartsOnError: false },
		params: { Bucket, Key, Body: body },
	});
	const sending: Sending = { body, done: upload.done(), lost: new AbortController() };
	// a service that is lost ends the body by itself; what it says is told when the sending is given up
	body.on('error', () => undefined);
	sending.done.catch((fault: unknown) => {
		sending.fault = fault;
		sending.lost.abort();
	});
	return sending;
}

async function tee(source: Readable, path: string, { body, done, lost }: Sending) {
	const hash = createHash('sha256');
	let bytes = 0;
	const { signal } = lost;
	async function* both(chunks: AsyncIterable<Buffer>) {
		for await (const chunk of chunks) {
			hash.update(chunk);
			bytes += chunk.length;
			if (!body.write(chunk)) await once(body, 'drain', { signal });
			yield chunk;
		}
	}
	await pipeline(source, both, createWriteStream(path, { mode: 0o600 }), { signal });
	body.end();
	await done;
	return { digest: hash.digest('hex'), bytes };
}

/** Ends the sending, whichever side broke off. */
async function giveUp(bucket: Bucket, incoming: string, { body, done }: Sending): Promise<void> {
	body.destroy(new Error('the sender broke off'));
	const ended = await done.then(
		() => true,
		() => false,
	);
	// the upload takes its own parts back; only a whole object is left to be removed
	if (ended) await leave(bucket, incoming);
}

/** Removes an object that nobody names; where the service is away just now, `tidy` does so later. */
export const leave = async ({ client, name: Bucket }: Bucket, Key: string): Promise<void> => {
	await client
		.send(new DeleteObjectCommand({ Bucket, Key }))
		.catch((problem: unknown) => log.warn({ error: String(problem) }, 'left to be tidied'));
};
