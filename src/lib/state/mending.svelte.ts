import type { ProposalAnswer, ProposalRequest } from '$lib/engines/palettes';
import { PaletteWorker } from './palette-worker';

/**
 * Has mends of the palette looked for in a worker of its own, so that neither the page nor a lock set
 * meanwhile waits for it. Holds what was proposed so far, in the order of its kinds.
 */
export class Mending {
	answers: ProposalAnswer[] = $state.raw([]);
	working = $state(false);
	/** the search ended without an answer: what it said */
	failure = $state('');
	readonly #worker: PaletteWorker;

	constructor(makeWorker: () => Worker) {
		this.#worker = new PaletteWorker(makeWorker);
	}

	ask(request: ProposalRequest) {
		this.drop();
		this.working = true;
		this.#worker.ask({ mend: request }, (reply) => {
			if ('answer' in reply) this.answers = [...this.answers, reply.answer];
			else this.working = false;
			if ('failed' in reply) this.failure = reply.failed;
		});
	}

	/** Ends a search that is going on; what was proposed stays. */
	stop() {
		this.#worker.drop();
		this.working = false;
	}

	/** Ends a search that is going on and forgets what was proposed. */
	drop() {
		this.stop();
		this.answers = [];
		this.failure = '';
	}
}
