import { colour } from '$lib/engines/colouring';
import type { ColourReply, ColourRequest } from '$lib/state/colourer';

/** In: one colouring problem a message. Out: the engine's result, or how it failed, under the same id. */
self.onmessage = async ({ data: { id, problem } }: MessageEvent<ColourRequest>) => {
	const started = performance.now();
	let reply: ColourReply;
	try {
		const result = await colour(problem);
		reply = { id, result, milliseconds: performance.now() - started };
	} catch (error) {
		reply = { id, failed: error instanceof Error ? error.message : String(error) };
	}
	self.postMessage(reply);
};
