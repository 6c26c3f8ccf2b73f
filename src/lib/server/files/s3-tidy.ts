import {
	AbortMultipartUploadCommand,
	DeleteObjectCommand,
	ListMultipartUploadsCommand,
	ListObjectsV2Command,
} from '@aws-sdk/client-s3';
import { asFilesAway, type Bucket } from './s3-bucket.ts';
import { incomingPrefix as Prefix } from './s3-receive.ts';
import { isLeftOver } from './spool.ts';

/** Removes what was arriving when a process was killed; whatever is younger than a day stays. */
export const tidyBucket = (bucket: Bucket): Promise<void> =>
	asFilesAway(async () => {
		await dropObjects(bucket);
		await dropUploads(bucket);
	});

async function dropObjects({ client, name: Bucket }: Bucket): Promise<void> {
	let ContinuationToken: string | undefined;
	do {
		const page = await client.send(new ListObjectsV2Command({ Bucket, Prefix, ContinuationToken }));
		for (const { Key, LastModified } of page.Contents ?? []) {
			if (!isLeftOver(LastModified?.getTime())) continue;
			await client.send(new DeleteObjectCommand({ Bucket, Key }));
		}
		ContinuationToken = page.NextContinuationToken;
	} while (ContinuationToken);
}

/** Parts of uploads that never ended; not every service lists them, and some drop them by themselves. */
async function dropUploads({ client, name: Bucket }: Bucket): Promise<void> {
	const open = await client
		.send(new ListMultipartUploadsCommand({ Bucket, Prefix }))
		.catch((problem: Error) => {
			if (problem.name === 'NotImplemented') return { Uploads: [] };
			throw problem;
		});
	for (const { Key, UploadId, Initiated } of open.Uploads ?? []) {
		if (!isLeftOver(Initiated?.getTime())) continue;
		await client.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
	}
}
