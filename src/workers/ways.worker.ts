import { colour } from '$lib/engines/colouring';
import { explain } from '$lib/engines/colouring/explain';
import type { WayQuestion, WayReply } from '$lib/state/ways/way-worker';

/**
 * Works out ways out of a collision, apart from the worker that answers locks. In: a problem to be
 * coloured, or one whose cheapest release is to be looked for. Out: the result; of a release also every
 * better one and every better bound on the way.
 */
self.onmessage = async ({ data }: MessageEvent<WayQuestion>) => {
	const reply = (message: WayReply) => self.postMessage(message);
	try {
		if ('way' in data) reply({ result: await colour(data.way) });
		else {
			const releaseFound = (soFar: NonNullable<WayReply['soFar']>) => reply({ soFar });
			const explanation = await explain({ ...data.release, releaseFound });
			reply({ release: explanation?.release ?? null });
		}
	} catch (error) {
		reply({ failed: error instanceof Error ? error.message : String(error) });
	}
};
