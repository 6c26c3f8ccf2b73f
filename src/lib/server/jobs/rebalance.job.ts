import type { Workshop } from './workshop.ts';

/**
 * Works out one proposal: takes it up, has the plan made and checked in a thread, and stores what came of
 * it. Safe to be called any number of times for the same proposal, by any number of workers: only a
 * holder of the claim changes anything.
 */
export async function runRebalance(
	_shop: Workshop,
	_proposalId: string,
	_shutdown: AbortSignal,
): Promise<void> {}
