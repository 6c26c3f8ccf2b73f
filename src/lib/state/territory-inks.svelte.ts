import type { BorderList } from '$lib/engines/borders/border-list';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import { Colourer, type ColourReply } from './colourer';
import { fewestChanges, fewestInks, inksByNumber, sameBorders } from './territory-colours';

type Inks = Readonly<Record<string, number>>;

interface Question {
	keys: readonly string[];
	borders: BorderList;
	most: number;
	plain: ColouringProblem;
}

/**
 * Inks of today's territories, found anew in a worker after each change so that as few as can be differ
 * from those last saved.
 */
export class TerritoryInks {
	/** those the server has stored, by key */
	saved: Inks = $state.raw()!;
	now: Inks = $state.raw()!;
	/** why neighbouring territories cannot be told apart; '' while all is well */
	trouble: string = $state()!;

	#colourer: Colourer | null = null;
	#asked: Question | null = null;
	/** whether the first of the two questions has been answered */
	#counted = false;
	#soon: ReturnType<typeof setTimeout> | undefined;

	constructor(inks: Inks, note: string | null) {
		this.saved = inks;
		this.now = inks;
		this.trouble = note ?? '';
	}

	/** In the browser: the worker that answers. */
	work(makeWorker: () => Worker): () => void {
		this.#colourer = new Colourer(makeWorker, (reply) => this.#settle(reply));
		return () => {
			clearTimeout(this.#soon);
			this.#colourer?.stop();
			this.#colourer = null;
			this.#asked = null;
		};
	}

	/** Asks once the figures of a change are on the screen; `look` gives territories and borders as they are then. */
	askSoon(look: () => Omit<Question, 'plain'>) {
		clearTimeout(this.#soon);
		if (this.#colourer) this.#soon = setTimeout(() => this.#ask(look()), 0);
	}

	/** What the server has stored; shown as well, unless something has changed since. */
	adopt(inks: Inks, note: string | null, show: boolean) {
		this.saved = inks;
		if (!show) return;
		this.now = inks;
		this.trouble = note ?? '';
	}

	#ask({ keys, borders, most }: Omit<Question, 'plain'>) {
		const known = keys.every((key) => Object.hasOwn(this.now, key));
		const asked = this.#asked;
		const same = asked?.keys.join() === keys.join() && asked.most === most;
		if (!keys.length || (known && same && sameBorders(asked.borders, borders))) return;
		const plain = fewestInks(keys.length, borders);
		this.#asked = { keys, borders, most, plain };
		this.#counted = false;
		this.#colourer?.ask(plain);
	}

	#settle(reply: ColourReply) {
		const asked = this.#asked;
		if (!asked) return;
		if ('failed' in reply)
			this.trouble = `The inks of territories were not found (${reply.failed}).`;
		else if (this.#counted) {
			if (reply.result.status !== 'coloured') return;
			const { colouring } = reply.result;
			this.trouble = '';
			this.now = Object.fromEntries(asked.keys.map((key, t) => [key, colouring[t]]));
		} else {
			const previous = inksByNumber(asked.keys, this.saved);
			const next = fewestChanges(asked.plain, reply.result, previous, asked.most);
			this.#counted = true;
			if (typeof next === 'string') this.trouble = next;
			else this.#colourer?.ask(next);
		}
	}
}
