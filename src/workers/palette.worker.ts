import { partInks } from '$lib/engines/colouring';
import { proposeMends } from '$lib/engines/palettes';
import type { PaletteQuestion, PaletteReply } from '$lib/state/palette-worker';

/**
 * In: mends of a palette to be proposed, or a colouring that parts unsafe inks. Out: every proposal as it is
 * found and then that the search has ended; or the one answer; or how it failed.
 */
self.onmessage = ({ data }: MessageEvent<PaletteQuestion>) => {
	const reply = (message: PaletteReply) => self.postMessage(message);
	try {
		if ('part' in data) return reply({ parting: partInks(data.part) });
		for (const answer of proposeMends(data.mend)) reply({ answer });
		reply({ ended: true });
	} catch (error) {
		reply({ failed: error instanceof Error ? error.message : String(error) });
	}
};
