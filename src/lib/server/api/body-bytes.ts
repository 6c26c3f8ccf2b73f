import { ApiFault } from './fault.ts';

/** Largest body that is not a file, in bytes. */
export const mostBody = 32 * 1024 * 1024;

/**
 * The bytes of a body of one media type; 415 for another type, 413 for too many, as soon as that shows.
 */
export async function bodyBytes(request: Request, mediaType: string): Promise<Uint8Array> {
	const [type] = (request.headers.get('content-type') ?? '').split(';');
	if (type.trim().toLowerCase() !== mediaType) {
		throw new ApiFault(415, 'unsupported-type', `send the body as ${mediaType}`);
	}
	if (Number(request.headers.get('content-length') ?? 0) > mostBody) throw tooLarge();
	const chunks: Uint8Array[] = [];
	let bytes = 0;
	for await (const chunk of request.body ?? []) {
		bytes += chunk.length;
		if (bytes > mostBody) throw tooLarge();
		chunks.push(chunk);
	}
	return Buffer.concat(chunks);
}

const tooLarge = () => new ApiFault(413, 'too-large', 'a body may have 32 MB');
