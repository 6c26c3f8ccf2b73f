import type { GoalFigure } from '$lib/engines/colouring/goal-figures';
import type { GoalWish } from '$lib/engines/colouring/goal-wish';
import type { WeakestPair } from '$lib/engines/colouring/weakest-pair';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import { inkDistances, readers } from '$lib/engines/palettes';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';
import type { Desk } from './desk.svelte';

export interface ImproveAsk {
	problem: ColouringProblem;
	colouring: Int32Array;
	wishes: readonly GoalWish[];
	inks: number;
	seed: number;
}
export type WeakestNews = Omit<WeakestPair, 'without'>;
export type ImproveNews =
	| { before: GoalFigure[] }
	| {
			steps: number;
			/** the best colouring and what it comes to, when it is another than was told last */
			found: { best: Int32Array; figures: GoalFigure[] } | null;
			/** every goal is as good as it can be */
			done: boolean;
			/** nothing is left to gain */
			ended: boolean;
			weakest: WeakestNews | null;
	  }
	| { failed: string };

/** The least of the desk that a colouring is improved on. */
export type ImproveDesk = Pick<
	Desk,
	'sheet' | 'draft' | 'colouring' | 'countedBorders' | 'trial' | 'problemOf'
>;

/** One goal before and now, each computed afresh from the colouring by code that is not the improver's. */
export interface FigurePair {
	wish: GoalWish;
	before: GoalFigure;
	now: GoalFigure;
}

/**
 * Improving the colouring of the draft towards its goals, in a worker, for as long as the user lets it.
 * The sheet shows the best so far on trial; the draft stays as it is until that is kept.
 */
export class Improving {
	state: 'idle' | 'running' | 'stopped' | 'done' = $state('idle');
	steps = $state(0);
	figures: FigurePair[] = $state.raw([]);
	weakest: WeakestNews | null = $state.raw(null);
	failure = $state('');
	/** regions whose ink differs from the draft's */
	moved = $state(0);

	#worker: Worker | null = null;
	#since = 0;
	#shown: Int32Array | null = $state.raw(null);

	constructor(
		private readonly desk: ImproveDesk,
		private readonly makeWorker: () => Worker,
	) {}

	/** why it cannot be started now; '' when it can */
	get hindrance(): string {
		const { draft, colouring } = this.desk;
		if (draft.document.goals.length === 0) return 'Choose at least one aim.';
		if (colouring.working) return 'The colouring is being worked out.';
		if (colouring.answer?.status !== 'coloured')
			return 'There is no colouring that keeps every rule yet.';
		return '';
	}

	/** whether the sheet still shows what was found here */
	get shows(): boolean {
		return this.#shown !== null && this.desk.trial.now?.inks === this.#shown;
	}

	/** Starts from the colouring of the draft. `previous`: what the fewest changes are measured against. */
	start(previous: Int32Array | null) {
		const { draft, colouring, trial } = this.desk;
		const { answer, inks: colours } = colouring;
		if (this.hindrance || answer?.status !== 'coloured') return;
		this.end();
		trial.drop();
		this.#since = trial.drops;
		const wishes = draft.document.goals;
		const problem = problemFor(this.desk, draft.document, previous);
		this.state = 'running';
		this.#run({
			...{ problem, wishes, colouring: colours, seed: draft.document.seed },
			inks: answer.inksUsed,
		});
	}

	/** Ends the work; the best so far stays on the sheet, to be kept or dropped. */
	stop() {
		this.#terminate();
		if (this.state === 'running') this.state = 'stopped';
	}

	/** Takes the best so far over into the draft, as one step. */
	keep() {
		if (!this.shows) return;
		this.end();
		this.desk.trial.keep();
	}

	/** Goes back to the colouring of the draft. */
	drop() {
		if (this.shows) this.desk.trial.drop();
		this.end();
	}

	/** Ends the work and forgets what it found. */
	end() {
		this.#terminate();
		this.#shown = null;
		this.figures = [];
		this.weakest = null;
		this.failure = '';
		this.moved = 0;
		this.steps = 0;
		this.state = 'idle';
	}

	/** The trial was dropped or another one laid on, or the draft changed: nothing here holds any more. */
	heard() {
		if (this.state === 'idle') return;
		const changed = this.desk.trial.drops !== this.#since;
		if (changed || (this.#shown !== null && !this.shows)) this.end();
	}

	#run(asked: ImproveAsk) {
		const worker = this.makeWorker();
		this.#worker = worker;
		worker.onmessage = ({ data }: MessageEvent<ImproveNews>) => {
			if (worker === this.#worker) this.#hear(data);
		};
		worker.onerror = ({ message }) => this.#hear({ failed: message });
		worker.postMessage(asked);
	}

	#hear(news: ImproveNews) {
		if ('failed' in news) {
			this.stop();
			this.failure = `Improving ended without an answer (${news.failed}).`;
			return;
		}
		if ('before' in news) {
			const { goals } = this.desk.draft.document;
			const pairs = news.before.map((figure, goal) => ({ before: figure, now: figure, goal }));
			this.figures = pairs.map(({ goal, ...pair }) => ({ wish: goals[goal], ...pair }));
			return;
		}
		this.steps = news.steps;
		this.weakest = news.weakest;
		if (news.found) this.#show(news.found.best, news.found.figures);
		if (!news.ended) return;
		this.#terminate();
		this.state = 'done';
	}

	#show(inks: Int32Array, figures: readonly GoalFigure[]) {
		const { trial, colouring, draft } = this.desk;
		const { answer } = colouring;
		if (answer?.status !== 'coloured') return;
		this.figures = this.figures.map((pair, goal) => ({ ...pair, now: figures[goal] }));
		this.moved = inks.reduce((sum, ink, r) => sum + Number(ink !== colouring.inks[r]), 0);
		this.#shown = inks;
		trial.show({
			...{ label: 'arrange the inks', document: draft.document, inks },
			...{ answer: arranged(answer, inks), arranges: true },
		});
	}

	#terminate() {
		this.#worker?.terminate();
		this.#worker = null;
	}
}

/** What the goals are measured by: areas, shared metres, and how far apart inks are for whoever counts. */
export function problemFor(
	desk: Pick<ImproveDesk, 'sheet' | 'countedBorders' | 'problemOf'>,
	document: Draft,
	previous: Int32Array | null,
): ColouringProblem {
	const seenBy = document.goals.find(({ kind }) => kind === 'distinct')?.readers ?? readers;
	const hexes = document.palette.inks.map(({ hex }) => hex);
	return {
		...desk.problemOf(document, null),
		areas: Float64Array.from(desk.sheet.regions.areaKm2),
		lengths: desk.countedBorders.metres,
		inkDistances: inkDistances(hexes, seenBy),
		...(previous ? { previous } : {}),
	};
}

/** The same proof stands: as many inks, otherwise arranged. */
function arranged(
	answer: Extract<DeskColouring, { status: 'coloured' }>,
	inks: Int32Array,
): DeskColouring {
	return { ...answer, inks: [...inks] };
}
