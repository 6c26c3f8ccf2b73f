import { gunzipSync } from 'node:zlib';
import { Readable } from 'node:stream';
import type { EditionFile } from './services/edition.service.ts';

/** Whether the asker holds these very bytes already. */
export const isHeld = (request: Request, tag: string): boolean =>
	(request.headers.get('if-none-match') ?? '').split(/\s*,\s*/).includes(`"${tag}"`);

export const notModified = (tag: string, headers: Record<string, string> = {}): Response =>
	new Response(null, { status: 304, headers: { etag: `"${tag}"`, ...headers } });

/** Packed bytes, as they are for those who unpack them and unpacked for those who do not. */
export function gzipped(
	request: Request,
	packed: Uint8Array,
	headers: Record<string, string>,
): Response {
	const unpacks = /\bgzip\b/.test(request.headers.get('accept-encoding') ?? '');
	const bytes = unpacks ? packed : gunzipSync(packed);
	return new Response(bytes as Uint8Array<ArrayBuffer>, {
		headers: {
			...headers,
			...(unpacks ? { 'content-encoding': 'gzip' } : {}),
			vary: 'accept-encoding',
			'content-length': String(bytes.byteLength),
		},
	});
}

/** Names of files that are made here are plain; whatever else comes is kept out of the header. */
export const attachment = (fileName: string): string =>
	`attachment; filename="${fileName.replace(/[^\w.-]/g, '_')}"`;

/** A drawn sheet may style itself and carry its letters; nothing else, wherever it is opened. */
export const svgPolicy = "default-src 'none'; style-src 'unsafe-inline'; font-src data:; sandbox";

/** A file of an edition: the bytes that were issued, which a browser that holds them need not fetch again. */
export async function editionFileResponse(request: Request, file: EditionFile): Promise<Response> {
	const headers = {
		etag: `"${file.digest}"`,
		'cache-control': 'private, max-age=31536000, immutable',
	};
	if (isHeld(request, file.digest)) return notModified(file.digest, headers);
	return bytesOf(file, headers);
}

/** A stored file whose address may lead to another one day: the browser asks whether it is still the same. */
export async function storedFileResponse(request: Request, file: EditionFile): Promise<Response> {
	const headers = { etag: `"${file.digest}"`, 'cache-control': 'private, no-cache' };
	if (isHeld(request, file.digest)) return notModified(file.digest, headers);
	return bytesOf(file, headers);
}

const bytesOf = async (file: EditionFile, headers: Record<string, string>): Promise<Response> =>
	new Response(Readable.toWeb(await file.open()) as ReadableStream, {
		headers: {
			...headers,
			'content-type': file.mediaType,
			'content-length': String(file.bytes),
			'content-disposition': attachment(file.name),
			'content-security-policy': svgPolicy,
		},
	});

/** A file that is made when it is asked for, to be kept by whoever asked. */
export const fileResponse = (file: {
	name: string;
	mediaType: string;
	bytes: Uint8Array;
}): Response =>
	new Response(file.bytes as Uint8Array<ArrayBuffer>, {
		headers: {
			'content-type': file.mediaType,
			'content-length': String(file.bytes.byteLength),
			'content-disposition': attachment(file.name),
			'cache-control': 'private, no-store',
		},
	});
