import { colour } from '$lib/engines/colouring';
import type { ColourReply, ColourRequest, ReleaseNews } from '$lib/state/colourer';

/**
 * In: one colouring problem a message. Out: the engine's result, or how it failed, under the id it was asked
 * for, and before it every better release of locks that collide.
 */
self.onmessage = async ({ data }: MessageEvent<ColourRequest>) =>
	self.postMessage(await coloured(data));

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

const messageOf = (error: unknown) => (error instanceof Error ? error.message : String(error));
