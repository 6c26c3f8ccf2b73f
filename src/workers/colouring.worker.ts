import { colour } from '$lib/engines/colouring';
import { mendPalette } from '$lib/engines/palettes/mend';
import type { ColourReply, ColourRequest, ReleaseNews } from '$lib/state/colourer';
import type { MendQuestion, MendReply } from '$lib/state/mending.svelte';

/**
 * In: one colouring problem, or one palette to be mended, a message. Out: the engine's result, or how it
 * failed; a colouring's under the id it was asked for, and before it every better release of locks that
 * collide.
 */
self.onmessage = async ({ data }: MessageEvent<ColourRequest | MendQuestion>) =>
	self.postMessage('mend' in data ? mended(data) : await coloured(data));

async function coloured({ id, problem }: ColourRequest): Promise<ColourReply> {
	const started = performance.now();
	try {
		const releaseFound = (soFar: ReleaseNews['soFar']) =>
			self.postMessage({ id, soFar } satisfies ReleaseNews);
		const result = await colour({ ...problem, releaseFound });
		return { id, result, milliseconds: performance.now() - started };
	} catch (error) {
		return { id, failed: messageOf(error) };
	}
}

function mended({ mend }: MendQuestion): MendReply {
	try {
		return { result: mendPalette(mend) };
	} catch (error) {
		return { failed: messageOf(error) };
	}
}

const messageOf = (error: unknown) => (error instanceof Error ? error.message : String(error));
