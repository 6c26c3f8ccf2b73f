import type { ColouringProblem, ColouringResult, Release } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';
import { Colourer, type ColourReply } from './colourer';
import { colouringParts } from './problem-of-draft';
import { rehearsals } from './rehearsals';

export interface ColouringStart {
	document: Draft;
	answer: DeskColouring | null;
	/** the last colouring the server stored, null before the first */
	lastInks: readonly number[] | null;
	regions: number;
	/** what is asked of the engine for a document, staying near to `previous` */
	problem: (document: Draft, previous: Int32Array | null) => ColouringProblem;
	/** whether a document asks for another arrangement, held to no colouring before it */
	afresh: (document: Draft) => boolean;
	/** says what was found, in one sentence */
	sentence: (result: ColouringResult, document: Draft) => string;
	/** an answer came for what is shown */
	onsettled: () => void;
}

/** What belongs to a document, so that undo shows it again at once. */
interface Known {
	answer: DeskColouring | null;
	inks: Int32Array;
}

/**
 * The colouring of the draft: asked of the engine after each change and remembered for every document.
 * A colouring that the server would not find by itself (arranged towards goals, or brought back by undo)
 * goes with the next save, and later ones stay near to it.
 */
export class ColouringOnDesk {
	/** what is known about the draft as it stands */
	answer: DeskColouring | null = $state.raw(null);
	/** the last colouring that kept every rule; -1 where there is none */
	inks: Int32Array = $state.raw()!;
	working = $state(false);
	/** while it works: the cheapest release of colliding locks found so far, and its bound */
	soFar: Release | null = $state.raw(null);
	/** the engine ended without an answer: what it said */
	failure = $state('');
	/** how long the engine took for its last answer here, in milliseconds; null before the first */
	took: number | null = $state(null);

	#start: ColouringStart;
	#colourer: Colourer | null = null;
	#asked: readonly unknown[];
	#askedFor: Draft;
	/** the last colouring the server has stored: what it stays near to, and so must we */
	#saved: Int32Array | null;
	/** whether what is shown is not what the server would find from there */
	#own = false;
	#known = new WeakMap<Draft, Known>();

	constructor(start: ColouringStart) {
		this.#start = start;
		this.answer = start.answer;
		this.#saved = start.lastInks && Int32Array.from(start.lastInks);
		this.inks = this.#saved ?? new Int32Array(start.regions).fill(-1);
		this.#askedFor = start.document;
		this.#asked = colouringParts(start.document);
		this.#remember(start.document);
	}

	/** the last colouring the server has stored */
	get saved(): Int32Array | null {
		return this.#saved;
	}

	/** In the browser: the worker that answers each change. */
	work(makeWorker: () => Worker): () => void {
		this.#colourer = new Colourer(
			makeWorker,
			(reply) => this.#settle(reply),
			(soFar) => (this.soFar = soFar),
		);
		this.#colourer.warm();
		return () => {
			this.#colourer?.stop();
			this.#colourer = null;
		};
	}

	/** Has the engine run, so that the first lock is answered at once. */
	rehearse(document: Draft) {
		const problem = this.#start.problem(document, this.#saved);
		this.#colourer?.rehearse(rehearsals(problem, this.inks));
	}

	/** Stops a colouring that takes long; what is on the sheet stays. */
	stop() {
		this.#colourer?.stop();
		this.working = false;
		this.failure = 'Stopped. The sheet shows the last colouring that kept every rule.';
	}

	/** Another document is shown. Whether another colouring goes with it. */
	follow(document: Draft): boolean {
		const known = this.#known.get(document);
		const parts = colouringParts(document);
		const unchanged = parts.every((part, index) => part === this.#asked[index]);
		this.#asked = parts;
		if (known) this.#show(known);
		else if (!unchanged) this.#ask(document);
		else if (this.working) this.#askedFor = document;
		else this.#remember(document);
		return known !== undefined || !unchanged;
	}

	/** Puts a colouring to a document that is about to be shown. */
	know(document: Draft, answer: DeskColouring | null, inks: Int32Array) {
		this.#known.set(document, { answer, inks });
	}

	/** The colouring to be saved with a document, where the server would find another by itself. */
	toSave(document: Draft): number[] | undefined {
		const known = this.#known.get(document);
		if (!this.#own || known?.answer?.status !== 'coloured') return undefined;
		return known.answer.inks;
	}

	/** The answer shown with a document, to be kept with it where the server would find another. */
	toKeep(document: Draft): DeskColouring | undefined {
		return this.toSave(document) && (this.#known.get(document)?.answer ?? undefined);
	}

	/** What the server stored; shown where the document is the one it has. */
	adoptSaved(answer: DeskColouring | null, document: Draft, dirty: boolean) {
		if (answer?.status === 'coloured') this.#saved = Int32Array.from(answer.inks);
		if (dirty) return;
		this.#own = false;
		this.#adopt(answer, document);
	}

	#show({ answer, inks }: Known) {
		this.#colourer?.forget();
		this.working = false;
		this.failure = '';
		this.answer = answer;
		this.inks = inks;
		this.#own = true;
	}

	#ask(document: Draft) {
		this.#askedFor = document;
		this.working = this.#colourer !== null;
		this.soFar = null;
		this.failure = '';
		const afresh = this.#start.afresh(document);
		if (afresh) this.#own = false;
		const near = this.#own ? this.inks : this.#saved;
		this.#colourer?.ask(this.#start.problem(document, afresh ? null : near));
	}

	#settle(reply: ColourReply) {
		this.working = false;
		if ('failed' in reply) {
			this.failure = `The colouring ended without an answer (${reply.failed}).`;
			return;
		}
		this.took = reply.milliseconds;
		const sentence = this.#start.sentence(reply.result, this.#askedFor);
		this.#adopt(deskColouring(reply.result, sentence), this.#askedFor);
		this.#start.onsettled();
	}

	#adopt(answer: DeskColouring | null, document: Draft) {
		if (!answer) return;
		this.answer = answer;
		if (answer.status === 'coloured') this.#showInks(Int32Array.from(answer.inks));
		this.#remember(document);
	}

	#showInks(inks: Int32Array) {
		const same = inks.length === this.inks.length && inks.every((ink, i) => ink === this.inks[i]);
		if (!same) this.inks = inks;
	}

	#remember(document: Draft) {
		this.#known.set(document, { answer: this.answer, inks: this.inks });
	}
}

/** The engine's answer as the desk and the server speak of it. */
export function deskColouring(result: ColouringResult, sentence: string): DeskColouring {
	if (result.status !== 'coloured') return { ...result, sentence };
	const { inksUsed, lowerBound, proof, colouring } = result;
	return { status: 'coloured', inks: [...colouring], inksUsed, lowerBound, proof, sentence };
}
