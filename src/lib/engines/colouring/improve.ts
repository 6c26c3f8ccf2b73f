import { newBoard, setInk, type Board } from './board.ts';
import { Chains } from './chains.ts';
import { wishesOf } from './changes.ts';
import { effortOf } from './effort.ts';
import { fewestChanges } from './fewest-changes.ts';
import type { GoalKind, GoalWish } from './goal-wish.ts';
import type { Aim } from './improve-aim.ts';
import { aimsOf, ChangesAim } from './improve-aims.ts';
import { groundOf, type Ground } from './improve-ground.ts';
import { GoalOrder } from './improve-order.ts';
import { Phase } from './improve-phase.ts';
import { properBoard } from './improve-start.ts';
import { byRegion, prepare, type Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';
import { Random } from './random.ts';
import { weakestPair, type WeakestPair } from './weakest-pair.ts';

/** Chains of 4 to 512 vertices are turned; longer ones seldom help, and cost. */
const shortest = 4;
const doublings = 8;
/** Tries of a phase for each vertex, round by round. */
const triesEach = [10, 30, 100, 300];
const fewestTries = 2_000;
/** How warm a phase starts, round by round: restarts take turns with fine work. */
const warmths = [1, 1, 0.3, 0.5, 0.1];

export interface ImproveSettings {
	/** inks that may be used: 0 .. inks - 1 */
	inks: number;
	seed?: number;
	/** asked while the fewest changes are computed at the start */
	cancelled?: () => boolean;
}

/** Where one goal stands in the best colouring: what is to be small, and below what it cannot be. */
export interface AimFigure {
	kind: GoalKind;
	before: number;
	now: number;
	bound: number;
	/** nobody could tell it from the bound */
	reached: boolean;
}

/**
 * Moves a proper colouring through proper colourings towards several goals in their order, for as long as
 * it is run; a longer run finds the same or better. The inks stay the same in number, and every lock and
 * rule is kept at every moment. The same problem, colouring, wishes and seed give the same colouring after
 * the same number of steps, however they were cut into runs.
 *
 * Moves are exchanges of Kempe chains, single regions among them: the goals in turn are followed by
 * falling heat, the earlier ones held within their limits (see `GoalOrder`), round after round with more
 * tries, always from the best so far. `fewest-changes` begins at the exact optimum of that goal.
 */
export class Improver {
	/** grows whenever `best` is another colouring */
	version = 0;
	/** what the weakest pair of inks leaves open, once it was looked at; null without that goal */
	weakest: WeakestPair | null = null;
	/** going on would find nothing: every goal is met, or is one that no exchange can better */
	ended = false;
	private readonly aims: Aim[];
	private readonly order: GoalOrder;
	private readonly chains: Chains;
	private readonly random: Random;
	private readonly kept: Int32Array;
	private readonly prepared: Prepared;
	private readonly board: Board;
	private readonly ground: Ground;
	private phase: Phase | null = null;
	private round = -1;
	private until = 0;
	private tries = 0;
	private looked = 0;
	private readonly afters: Float64Array;
	private readonly limit = (goal: number) => this.order.limit(goal);
	private begun = false;
	private loose: number[] | null = null;

	constructor(
		private readonly problem: ColouringProblem,
		colouring: ArrayLike<number>,
		wishes: readonly GoalWish[],
		private readonly settings: ImproveSettings,
	) {
		this.prepared = prepare(problem);
		this.board = properBoard(this.prepared, colouring, settings.inks);
		this.ground = groundOf(problem, this.prepared, this.board);
		this.aims = aimsOf(this.ground, wishes);
		this.afters = new Float64Array(this.aims.length);
		this.chains = new Chains(this.board);
		this.random = new Random(settings.seed ?? 0);
		this.kept = this.board.ink.slice();
		const gives = wishes.map(({ give }) => give);
		this.order = new GoalOrder(this.values(), gives, (goal) => this.aims[goal].enough);
	}

	/** steps taken: turns tried and regions looked at for them */
	get steps(): number {
		return this.chains.steps + this.tries;
	}

	/** every goal is as good as it can be */
	get done(): boolean {
		return this.begun && this.aims.every(({ enough }, goal) => this.order.kept[goal] <= enough);
	}

	/** The ink of every region in the best colouring so far. */
	get best(): Int32Array {
		return byRegion(this.prepared, this.kept);
	}

	/** Where every goal stands in the best colouring so far. */
	figures(): AimFigure[] {
		const { start, kept } = this.order;
		return this.aims.map(({ kind, bound, enough }, goal) => ({
			...{ kind, bound, before: start[goal], now: kept[goal] },
			reached: kept[goal] <= enough,
		}));
	}

	/** Goes on for so many steps, or until every goal is as good as it can be. */
	run(steps: number): void {
		this.until += steps;
		if (!this.begun) this.begin();
		while (this.steps < this.until && !this.ended) {
			if (!this.phase || this.phase.over) this.nextPhase();
			if (this.phase) this.step(this.phase);
		}
		this.look();
	}

	/** What is known to be good at the start: the fewest changes, and a sheet without the weakest pair. */
	private begin(): void {
		this.begun = true;
		const { problem, prepared, board, settings } = this;
		this.ended = board.inks < 2 || board.graph.count === 0;
		const distinct = this.aims.find(({ kind }) => kind === 'distinct');
		if (distinct) {
			this.weakest = weakestPair(this.ground);
			if (this.weakest.without) this.lay(this.weakest.without);
		}
		const changes = this.aims.find((aim) => aim instanceof ChangesAim);
		if (!changes || !problem.previous) return;
		const wishes = wishesOf(problem, prepared, board.inks);
		const trial = newBoard(prepared.graph, board.inks, prepared.fixed, prepared.bans);
		this.kept.forEach((ink, v) => setInk(trial, v, ink));
		const { seed = 0, cancelled } = settings;
		const { ballConflicts: conflicts } = effortOf(problem);
		const least = fewestChanges(trial, wishes, { conflicts, seed, cancelled });
		changes.bound = wishes.compulsory + least;
		this.lay(trial.ink);
	}

	private lay(ink: Int32Array): void {
		ink.forEach((one, v) => setInk(this.board, v, one));
		for (const aim of this.aims) aim.read();
		this.look();
	}

	/** The next goal that can still gain, from the best colouring; null when none can. */
	private nextPhase(): void {
		this.look();
		const from = this.phase ? this.phase.goal + 1 : this.aims.length;
		// the very first phase begins where the fewest changes ended
		if (this.phase) this.lay(this.kept);
		for (let i = 0; i < this.aims.length; i++) {
			const goal = (from + i) % this.aims.length;
			if (goal === 0) this.round++;
			const aim = this.aims[goal];
			if (aim.value <= aim.enough || (goal === 0 && aim instanceof ChangesAim)) continue;
			const { count } = this.board.graph;
			const each = triesEach[Math.min(this.round, triesEach.length - 1)];
			this.phase = new Phase(this.aims, {
				goal,
				length: Math.max(fewestTries, each * count),
				warmth: warmths[this.round % warmths.length],
				descending: this.round === 0 ? 'cold' : this.round % 4 > 1 ? 'hot' : 'lukewarm',
				loose: this.round % 2 === 1,
			});
			return;
		}
		this.ended = true;
	}

	private step(phase: Phase): void {
		phase.tries++;
		this.tries++;
		const { board, random, chains } = this;
		const v = this.candidate(phase);
		const c = board.ink[v];
		const d = random.below(board.inks);
		if (c === d) return;
		// most chains are short or giant, and a giant one costs as much as hundreds of short ones
		const limit = shortest << random.below(doublings);
		const chain = chains.chain(v, d, limit);
		if (!chain) return;
		if (!this.allowed(phase, chain, c, d)) return;
		chains.turn(c, d);
		for (const aim of this.aims) aim.keep();
		const better = this.aims[phase.goal].value < this.order.kept[phase.goal];
		// the best is copied whole, so not at every gain of a long descent
		if (better && this.tries - this.looked > this.kept.length / 64) this.look();
	}

	/** Weighs a turn for the goal in hand and those before it; later ones follow. */
	private allowed(phase: Phase, chain: Uint32Array, c: number, d: number): boolean {
		const { aims, afters } = this;
		for (let goal = 0; goal <= phase.goal; goal++) {
			afters[goal] = aims[goal].after(chain, c, d);
			const held = goal < phase.goal && !phase.settings.loose;
			if (held && afters[goal] > Math.max(this.limit(goal), aims[goal].value)) {
				return this.refused(goal);
			}
		}
		if (!phase.takes(afters, this.limit, this.random)) return this.refused(phase.goal);
		for (let goal = phase.goal + 1; goal < aims.length; goal++) aims[goal].after(chain, c, d);
		return true;
	}

	private refused(last: number): false {
		for (let goal = 0; goal <= last; goal++) this.aims[goal].forget();
		return false;
	}

	/** Any vertex; where an earlier goal holds most to their old inks, mostly one of the others. */
	private candidate(phase: Phase): number {
		const { count } = this.board.graph;
		const changes = this.aims.findIndex((aim) => aim instanceof ChangesAim);
		if (changes < 0 || changes >= phase.goal) return this.random.below(count);
		if (phase.tries % 1024 === 1 || !this.loose) {
			this.loose = (this.aims[changes] as ChangesAim).loose();
		}
		const among = this.loose.length > 0 && this.random.below(4) > 0;
		return among ? this.loose[this.random.below(this.loose.length)] : this.random.below(count);
	}

	/** Keeps the board when it is the best so far. */
	private look(): void {
		this.looked = this.tries;
		if (!this.order.note(this.values())) return;
		this.kept.set(this.board.ink);
		this.version++;
	}

	private values(): number[] {
		return this.aims.map(({ value }) => value);
	}
}
