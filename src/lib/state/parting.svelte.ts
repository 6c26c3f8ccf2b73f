import type { Parting } from '$lib/engines/colouring/part-inks';
import type { ColouringResult } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';
import { deskColouring } from './colouring-on-desk.svelte';
import type { Desk } from './desk.svelte';
import { PaletteWorker } from './palette-worker';

type Ground = Pick<Desk, 'draft' | 'colouring' | 'problemOf' | 'trial'>;

/** What of a parting is told when it did not come about. */
export type Unparted = Exclude<Parting, { status: 'parted' }>;

/**
 * Recolours the sheet so that unsafe inks never touch, in a worker. What is found is shown on trial and
 * becomes one step of the draft when it is kept.
 */
export class PartingOnDesk {
	working = $state(false);
	unparted: Unparted | null = $state.raw(null);
	failure = $state('');
	readonly #worker: PaletteWorker;

	constructor(
		private readonly desk: Ground,
		makeWorker: () => Worker,
		private readonly sentence: (result: ColouringResult, document: Draft) => string,
	) {
		this.#worker = new PaletteWorker(makeWorker);
	}

	/** @param label what keeping it does, as Undo will name it */
	ask(unsafe: readonly (readonly [number, number])[], label: string) {
		const { draft, colouring, problemOf } = this.desk;
		this.drop();
		this.working = true;
		const { document } = draft;
		const problem = problemOf.call(this.desk, document, null);
		const question = { problem, unsafe, inks: document.palette.inks.length, from: colouring.inks };
		this.#worker.ask({ part: question }, (reply) => {
			this.working = false;
			if ('failed' in reply) this.failure = reply.failed;
			if ('parting' in reply) this.#settle(reply.parting, document, label);
		});
	}

	/** Ends a search that is going on and forgets what was said. */
	drop() {
		this.#worker.drop();
		this.working = false;
		this.unparted = null;
		this.failure = '';
	}

	#settle(parting: Parting, document: Draft, label: string) {
		if (parting.status !== 'parted') {
			this.unparted = parting;
			return;
		}
		const { inksUsed, colouring } = parting;
		// more inks than are needed: the draft asks for so many, else it would be coloured with fewer again
		const more = document.inks === 'fewest' && inksUsed > this.#fewest();
		const shown = more ? { ...document, inks: inksUsed } : document;
		const answer = this.#answer(shown, colouring, inksUsed);
		this.desk.trial.show({ label, document: shown, inks: colouring, answer });
	}

	#fewest(): number {
		const { answer } = this.desk.colouring;
		return answer?.status === 'coloured' ? answer.inksUsed : 0;
	}

	/** What is known of the least number stays known; a proof is about one number of inks. */
	#answer(document: Draft, colouring: Int32Array, inksUsed: number): DeskColouring {
		const { answer } = this.desk.colouring;
		const before = answer?.status === 'coloured' ? answer : null;
		const proof =
			before?.inksUsed === inksUsed ? before.proof : { kind: 'not-proved' as const, regions: [] };
		const lowerBound = Math.min(inksUsed, before?.lowerBound ?? 1);
		const result: ColouringResult = { status: 'coloured', colouring, inksUsed, lowerBound, proof };
		return deskColouring(result, this.sentence(result, document));
	}
}
