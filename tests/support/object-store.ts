import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import S3rver from 's3rver';
import type { S3Settings } from '../../src/lib/server/config.ts';

/** A local fake of an object store (s3rver), with one bucket. */
export interface FakeObjectStore {
	settings: S3Settings;
	/** where the fake keeps the objects of the bucket */
	folder: string;
	/** names of the objects in the bucket */
	objects(): Promise<string[]>;
	/** no longer answers, until `start` */
	stop(): Promise<void>;
	start(): Promise<void>;
	close(): Promise<void>;
}

const bucket = 'merestone';

export async function fakeObjectStore(): Promise<FakeObjectStore> {
	const directory = await mkdtemp(join(tmpdir(), 'merestone-objects-'));
	let port = 0;
	let server: S3rver | null = null;
	const start = async () => {
		const address = '127.0.0.1';
		const configureBuckets = [{ name: bucket, configs: [] }];
		server = new S3rver({ port, address, silent: true, directory, configureBuckets });
		port = (await server.run()).port;
	};
	const stop = async () => {
		await server?.close();
		server = null;
	};
	await start();
	return {
		// the fake's own fixed sign-in, from its README
		settings: {
			endpoint: `http://127.0.0.1:${port}`,
			...{ bucket, region: 'us-east-1', pathStyle: true, keyId: 'S3RVER', secret: 'S3RVER' },
		},
		folder: join(directory, bucket),
		async objects() {
			const files = await readdir(join(directory, bucket), { recursive: true });
			const objects = files.filter((name) => name.endsWith('._S3rver_object'));
			return objects.map((name) => name.replace(/\._S3rver_object$/, '')).sort();
		},
		stop,
		start,
		async close() {
			await stop();
			await rm(directory, { recursive: true, force: true });
		},
	};
}
