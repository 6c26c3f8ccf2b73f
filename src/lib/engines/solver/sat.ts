import { Activity } from './activity.ts';
import { Analysis } from './analysis.ts';
import { ClauseStore } from './clause-store.ts';
import { decode, encode, tidy } from './literals.ts';
import { propagate } from './propagate.ts';
import { ProofRecorder } from './proof-recorder.ts';
import { randomFrom } from './random.ts';
import { forgetHalf } from './reduction.ts';
import { Restarts } from './restarts.ts';
import { Trail } from './trail.ts';
import { Watches } from './watches.ts';

export interface Budget {
	/** most conflicts in this call; without end when absent */
	conflicts?: number;
	/** asked every thousand steps or so, with the conflicts of this call; true ends it with 'unknown' */
	cancelled?: (conflicts: number) => boolean;
}

export type Answer = 'sat' | 'unsat' | 'unknown';

const DECAY = 0.95;
const FIRST_REDUCTION = 2000;
const REDUCTION_STEP = 500;
const ASK_EVERY = 1024;

/**
 * Satisfiability by conflict-driven clause learning, incremental, with assumptions. Variables count
 * from 1; a literal is v or -v. The same seed and the same calls give the same answers.
 * Source: Een and Sorensson 2003 for the frame; the parts name theirs.
 */
export class Sat {
	/** conflicts met so far in all calls: the measure of effort spent */
	conflicts = 0;
	/** variables made so far */
	variables = 0;
	private store = new ClauseStore();
	private watches = new Watches();
	private trail = new Trail();
	private activity = new Activity();
	private analysis = new Analysis(this.trail, this.store, this.activity);
	private restarts = new Restarts();
	private proof: ProofRecorder | null;
	private random: (() => number) | null;
	/** last or wished value of each variable, 1 for false as in the literal code */
	private phases = new Uint8Array(16).fill(1);
	private model: Int8Array | null = null;
	private failed: number[] = [];
	private scratch: number[] = [];
	private contradiction = false;
	private nextReduction = FIRST_REDUCTION;
	private reductionGap = FIRST_REDUCTION;
	private readonly undo = (code: number) => {
		this.phases[code >> 1] = code & 1;
		this.activity.insert(code >> 1);
	};

	/** `seed` 0 (as when absent) leaves variables in order; `proof` records what `proofText` returns. */
	constructor(options: { seed?: number; proof?: boolean } = {}) {
		this.random = options.seed ? randomFrom(options.seed) : null;
		this.proof = options.proof ? new ProofRecorder() : null;
	}

	/** The number of a fresh variable. */
	newVariable(): number {
		const variable = ++this.variables;
		this.trail.grow(variable);
		this.analysis.grow(variable);
		this.watches.grow(2 * variable + 2);
		if (variable >= this.phases.length) {
			const larger = new Uint8Array(variable * 2).fill(1);
			larger.set(this.phases);
			this.phases = larger;
		}
		this.activity.enter(variable, this.random ? this.random() * 1e-6 : 0);
		return variable;
	}

	/** Adds a clause for good. False when the clauses now contradict each other at once. */
	addClause(literals: readonly number[]): boolean {
		for (let i = 0; i < literals.length; i++) this.mustKnow(literals[i]);
		if (this.contradiction) return false;
		const { values } = this.trail;
		const open = this.scratch;
		const size = tidy(literals, open);
		let keep = 0;
		for (let i = 0; i < size; i++) {
			if (values[open[i]] === 1) return true;
			if (values[open[i]] === 0) open[keep++] = open[i];
		}
		if (size < 0) return true;
		open.length = keep;
		if (keep > 1) {
			this.watches.attach(this.store, this.store.add(open, 0, 0));
			return true;
		}
		if (open.length === 1) this.trail.assign(open[0], -1);
		if (open.length === 0 || this.propagate() >= 0) this.contradict();
		return !this.contradiction;
	}

	/**
	 * 'sat': `value` tells an assignment. 'unsat': `core` tells which assumptions clash with the clauses
	 * (none: the clauses alone do). 'unknown': the budget is spent or the call was cancelled.
	 */
	solve(assumptions: readonly number[] = [], budget: Budget = {}): Answer {
		for (const literal of assumptions) this.mustKnow(literal);
		this.failed = [];
		this.model = null;
		if (this.contradiction) return 'unsat';
		const answer = this.search(assumptions.map(encode), budget);
		if (answer === 'sat') this.model = this.trail.values.slice(0, 2 * this.variables + 2);
		this.trail.backTo(0, this.undo);
		return answer;
	}

	/** Value of a variable in the assignment found last; throws unless the last answer was 'sat'. */
	value(variable: number): boolean {
		this.mustKnow(variable);
		if (!this.model) throw new Error('no assignment: the last answer was not sat');
		return this.model[2 * variable] === 1;
	}

	/** The assumptions that clashed in the last 'unsat' answer; not always the fewest. */
	core(): number[] {
		return this.failed.map(decode);
	}

	/** Wishes a value that is tried first. */
	setPhase(variable: number, value: boolean): void {
		this.mustKnow(variable);
		this.phases[variable] = value ? 0 : 1;
	}

	/**
	 * What was learnt, in the DRUP text form. It refutes the clauses when the answer was 'unsat' without
	 * assumptions, else the clauses together with the literals of `core` as clauses of one literal.
	 */
	proofText(): string {
		return this.proof?.text() ?? '';
	}

	private mustKnow(literal: number): void {
		const variable = Math.abs(literal);
		if (!Number.isInteger(literal) || variable < 1 || variable > this.variables) {
			throw new RangeError(`no such literal: ${literal}`);
		}
	}

	private propagate(): number {
		return propagate(this.trail, this.store, this.watches);
	}

	private contradict(): void {
		this.contradiction = true;
		this.proof?.learnt([]);
	}

	private search(assumed: number[], budget: Budget): Answer {
		const first = this.conflicts;
		const last = first + (budget.conflicts ?? Infinity);
		let steps = 0;
		for (;;) {
			if (++steps % ASK_EVERY === 0 && budget.cancelled?.(this.conflicts - first)) {
				return 'unknown';
			}
			const conflict = this.propagate();
			if (conflict >= 0) {
				if (this.trail.level === 0) {
					this.contradict();
					return 'unsat';
				}
				this.learnFrom(conflict, assumed.length);
				continue;
			}
			if (this.conflicts >= last) return 'unknown';
			if (this.conflicts >= this.nextReduction) this.reduce();
			const answer = this.decide(assumed);
			if (answer) return answer;
		}
	}

	private learnFrom(conflict: number, assumptions: number): void {
		this.conflicts++;
		const level = this.analysis.learn(conflict, this.conflicts);
		const { literals, glue } = this.analysis;
		this.trail.backTo(level, this.undo);
		this.proof?.learnt(literals);
		let reason = -1;
		if (literals.length > 1) {
			reason = this.store.add(literals, glue, this.conflicts);
			this.watches.attach(this.store, reason);
		}
		this.trail.assign(literals[0], reason);
		this.activity.decay(DECAY);
		if (this.restarts.conflict(glue) && level > assumptions) {
			this.trail.backTo(assumptions, this.undo);
		}
	}

	private reduce(): void {
		forgetHalf(this.store, this.trail, this.watches, this.proof);
		this.reductionGap += REDUCTION_STEP;
		this.nextReduction = this.conflicts + this.reductionGap;
	}

	/** Opens one level: the next assumption, else a variable of choice. */
	private decide(assumed: number[]): Answer | null {
		const { trail } = this;
		while (trail.level < assumed.length) {
			const code = assumed[trail.level];
			if (trail.values[code] === -1) return this.fail(code);
			trail.openLevel();
			if (trail.values[code] === 1) continue;
			trail.assign(code, -1);
			return null;
		}
		for (;;) {
			const variable = this.activity.take();
			if (variable === 0) return 'sat';
			if (trail.values[2 * variable] !== 0) continue;
			trail.openLevel();
			trail.assign(2 * variable + this.phases[variable], -1);
			return null;
		}
	}

	private fail(code: number): Answer {
		this.failed = [...this.analysis.blame(code), code];
		this.proof?.learnt(this.failed.map((assumption) => assumption ^ 1));
		return 'unsat';
	}
}
