import type { ColouringResult, Explanation, Release } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { Desk } from '../desk.svelte';
import { listWays } from './list-ways';
import type { Way, WayOutcome, WayRow } from './way';
import { outcomeOf } from './way-outcome';
import { WayWorker } from './way-worker';

/** The least of the desk that ways are worked out from and tried on. */
type Ground = Pick<
	Desk,
	'sheet' | 'draft' | 'colouring' | 'countedBorders' | 'problemOf' | 'nameOf' | 'trial'
>;

export interface WaysStart {
	desk: Ground;
	explanation: Explanation;
	makeWorker: () => Worker;
	sentence: (result: ColouringResult, document: Draft) => string;
}

/**
 * The ways out of one collision, each worked out beforehand in a worker of its own, one after the other,
 * so that they can be compared and tried at once. Nothing here changes the draft but a trial that is kept.
 */
export class WaysOut {
	rows: WayRow[] = $state.raw([]);
	/** the cheapest release known, and its bound */
	release: Release | null = $state.raw(null);
	/** whether a cheaper release or a better bound is looked for */
	looking = $state(false);
	/** why looking ended without an answer */
	failure = $state('');

	#start: WaysStart;
	#document: Draft;
	#ways: WayWorker;
	#looker: WayWorker;
	#running = false;

	constructor(start: WaysStart) {
		this.#start = start;
		this.#document = start.desk.draft.document;
		this.#ways = new WayWorker(start.makeWorker);
		this.#looker = new WayWorker(start.makeWorker);
		this.release = start.explanation.release;
		this.#list();
	}

	get settled(): boolean {
		return this.rows.every(({ outcome }) => outcome.state === 'works' || outcome.state === 'fails');
	}

	/** Works out every way that is not yet; comes to an end when all are, or when it is stopped. */
	async work() {
		if (this.#running) return;
		this.#running = true;
		for (let next = this.#next(); next; next = this.#next()) {
			this.#put(next.way, { state: 'working' });
			this.#put(next.way, await this.#workedOut(next.way));
		}
		this.#running = false;
	}

	/** Ends everything that is being worked out. */
	stop() {
		this.#ways.stop();
		this.#looker.stop();
		this.looking = false;
	}

	/** Shows a way on the sheet. The draft and its steps stay as they are until it is kept. */
	try({ way, outcome }: WayRow) {
		if (outcome.state !== 'works') return;
		const { draft, trial } = this.#start.desk;
		// the draft of this moment: its layout may have changed since the way was worked out
		const document = way.change(draft.document);
		trial.show({ label: way.label, document, answer: outcome.answer, inks: outcome.inks });
	}

	/** Drops a rule although others still collide: one step towards a colouring, which can be undone. */
	takeAnyway({ way }: WayRow) {
		this.#start.desk.draft.change(way.label, way.change);
	}

	/** Whether a row is what the sheet shows for a while. */
	tries({ outcome }: WayRow): boolean {
		return outcome.state === 'works' && this.#start.desk.trial.now?.inks === outcome.inks;
	}

	/** Looks for a cheaper release and a better bound, for as long as it is let. */
	async lookOn() {
		const { desk } = this.#start;
		const problem = { ...desk.problemOf(this.#document, null), effort: 'thorough' as const };
		this.looking = true;
		this.failure = '';
		const ended = await this.#looker.ask({ release: problem }, (soFar) => this.#improve(soFar));
		this.looking = false;
		if (ended.failed !== undefined) this.failure = ended.failed;
		else if (ended.release) this.#improve(ended.release);
		await this.#relist();
	}

	/** Ends the looking; what was found stays. */
	async enough() {
		this.#looker.stop();
		this.looking = false;
		await this.#relist();
	}

	#improve(found: Release) {
		const known = this.release;
		const cheaper = !known || found.cost < known.cost ? found : known;
		const lowerBound = Math.max(found.lowerBound, known?.lowerBound ?? 0);
		this.release = { ...cheaper, lowerBound, proved: found.proved || (known?.proved ?? false) };
	}

	/** Lists the ways again; those known already keep what was worked out. */
	async #relist() {
		this.#list();
		await this.work();
	}

	#list() {
		const { explanation, desk } = this.#start;
		const { regions, borders } = desk.sheet;
		const ground = { keys: regions.key, names: regions.name, borders };
		const ways = listWays({ ...explanation, release: this.release }, this.#document, ground);
		this.rows = ways.map((way) => {
			const known = this.rows.find((row) => row.way.id === way.id);
			return { way, outcome: known?.outcome ?? startOf(way) };
		});
	}

	#next(): WayRow | undefined {
		return this.rows.find(({ outcome }) => outcome.state === 'waiting');
	}

	#put(way: Way, outcome: WayOutcome) {
		this.rows = this.rows.map((row) => (row.way.id === way.id ? { ...row, outcome } : row));
	}

	async #workedOut(way: Way): Promise<WayOutcome> {
		const { desk, sentence } = this.#start;
		const document = way.change(this.#document);
		const before = desk.colouring.inks;
		const near = before.some((ink) => ink >= 0) ? before : null;
		const { result, failed } = await this.#ways.ask({ way: desk.problemOf(document, near) });
		if (!result) return { state: 'fails', words: `It could not be worked out (${failed}).` };
		const borders = desk.countedBorders;
		return outcomeOf(result, { document, before, borders, nameOf: desk.nameOf, sentence });
	}
}

const startOf = ({ hopeless }: Way): WayOutcome =>
	hopeless ? { state: 'fails', words: hopeless } : { state: 'waiting' };
