import { isHeld, notModified } from './bytes.ts';
import { forPage } from './page.ts';

/** A stored coverage, tagged by its boundary set and level: they never change, though the address may outlive it. */
export async function coverageResponse(
	request: Request,
	geometry: { tag: string; read(): Promise<Buffer> },
): Promise<Response> {
	// the browser asks each time, and is mostly told that it has it
	const headers = { 'cache-control': 'private, no-cache' };
	if (isHeld(request, geometry.tag)) return notModified(geometry.tag, headers);
	const bytes = await forPage(() => geometry.read());
	return new Response(bytes as Uint8Array<ArrayBuffer>, {
		headers: {
			...headers,
			etag: `"${geometry.tag}"`,
			'content-type': 'application/octet-stream',
			'content-length': String(bytes.byteLength),
		},
	});
}
