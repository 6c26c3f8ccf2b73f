import type { ContiguityScratch } from './contiguity.ts';
import { leastStreams } from './least-streams.ts';
import { realiseStreams } from './realise-streams.ts';
import type { SearchState } from './search-state.ts';

/** Bands are shrunk by so much of the target while streams are reckoned, since units are not sand. */
const MARGIN = 0.01;
/** Times the streams are reckoned anew from what was carried out. */
const TURNS = 3;

/**
 * Carries surplus over many territories to where it is missing, as a regional drift of the load asks
 * for: the least streams between neighbours, carried out by border units, reckoned anew. Annealing
 * alone finds such long ways too seldom.
 */
export async function carrySurplus(
	state: SearchState,
	scratch: ContiguityScratch,
	cutWeight: number,
	cancelled?: () => boolean,
): Promise<void> {
	for (let turn = 0; turn < TURNS && !cancelled?.(); turn++) {
		const streams = await leastStreams(state, MARGIN);
		if (streams.length === 0) return;
		realiseStreams(state, scratch, streams, cutWeight);
		state.sumLoads();
	}
}
