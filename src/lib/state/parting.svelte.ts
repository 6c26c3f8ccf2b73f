import { checkParting } from '$lib/engines/colouring/check-parting';
import type { Parting, PartingQuestion } from '$lib/engines/colouring/part-inks';
import type { ColouringProblem, ColouringResult } from '$lib/engines/colouring/problem';
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
	/** regions that have another ink in the colouring that is on trial; null while there is none */
	changed: number | null = $state(null);
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
			if (!('parting' in reply)) return;
			if (this.#holdsNow(reply.parting, document, question)) this.#settle(reply.parting, label);
			else this.failure = 'the draft was changed meanwhile; ask again';
		});
	}

	/** Whether an answer still answers: the draft may have been edited, or saved, since it was asked. */
	#holdsNow(parting: Parting, asked: Draft, { unsafe, inks, problem }: PartingQuestion): boolean {
		const { document } = this.desk.draft;
		if (document === asked) return true;
		const now = this.desk.problemOf(document, null);
		if (parting.status !== 'parted') return sameQuestion(problem, now);
		const count = Math.min(inks, document.palette.inks.length);
		return checkParting({ problem: now, unsafe, inks: count }, parting.colouring).length === 0;
	}

	/** Ends a search that is going on and forgets what was said. */
	drop() {
		this.#worker.drop();
		this.working = false;
		this.unparted = null;
		this.failure = '';
		this.changed = null;
	}

	#settle(parting: Parting, label: string) {
		// shown on the draft as it is by now: what was edited meanwhile stays
		const { document } = this.desk.draft;
		if (parting.status !== 'parted') {
			this.unparted = parting;
			return;
		}
		const { inksUsed, colouring, changes } = parting;
		this.changed = changes;
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

/** Whether two problems ask the same: names of locks and the like are no part of them. */
const sameQuestion = (one: ColouringProblem, two: ColouringProblem): boolean =>
	JSON.stringify(one) === JSON.stringify(two);
