import { checkProofText } from '$lib/engines/colouring/proofs/check';
import type { ProofReply, ProofRequest } from '$lib/state/proof-checking.svelte';

/** Checks a proof file off the page's thread. The checker is all it carries; it asks no server. */
self.onmessage = async ({ data }: MessageEvent<ProofRequest>) =>
	self.postMessage(await checked(data));

async function checked({ source }: ProofRequest): Promise<ProofReply> {
	const started = performance.now();
	try {
		const text = typeof source === 'string' ? source : await source.text();
		return { checked: checkProofText(text), milliseconds: performance.now() - started };
	} catch (error) {
		return { failed: error instanceof Error ? error.message : String(error) };
	}
}
