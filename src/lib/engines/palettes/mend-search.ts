import type { Triple } from '../colour/hex.ts';
import { hexOfOklab, oklabOf } from '../colour/oklab.ts';
import { appearanceOf, type Appearance } from './appearance.ts';
import { labelShortfall, moveOf, shortfall, type MendTask } from './mend-cost.ts';
import { normalDeviate } from './random.ts';

export interface Attempt {
	inks: string[];
	/** sum of all moves, CIEDE2000; meaningful when `missing` is 0 */
	move: number;
	/** how much is still missing, 0 when everything asked is reached */
	missing: number;
}

interface State extends Attempt {
	seen: Appearance[];
	places: Triple[];
}

/** First and last step in OKLab, first and last willingness to go uphill. */
const stride = [0.12, 0.003] as const;
const heat = [2, 0.02] as const;
const missingWeighs = 4;
const trace = 1e-9;

/**
 * Annealing over a few inks in OKLab, judged on the rounded hex values, so that what is found holds as
 * it is written.
 *
 * In: the task; the inks that may move; where all inks start; a number of steps; a random stream.
 * Out: the best state met: least missing, then least moved. Source of the method: Kirkpatrick et al. 1983.
 */
export function anneal(
	task: MendTask,
	movable: readonly number[],
	from: readonly string[],
	steps: number,
	random: () => number,
): Attempt {
	const state = stateOf(task, from);
	let best = snapshot(state);
	for (let step = 0; step < steps; step++) {
		const cooled = step / steps;
		const ink = movable[Math.floor(random() * movable.length)];
		const old = [state.inks[ink], state.seen[ink], state.places[ink]] as const;
		const [missing, move] = inkCost(task, state, ink);
		put(state, ink, nudge(state.places[ink], between(stride, cooled), random));
		const [nowMissing, nowMove] = inkCost(task, state, ink);
		const gain = missingWeighs * (missing - nowMissing) + move - nowMove;
		if (gain < 0 && random() >= Math.exp(gain / between(heat, cooled))) {
			[state.inks[ink], state.seen[ink], state.places[ink]] = old;
			continue;
		}
		state.missing += nowMissing - missing;
		state.move += nowMove - move;
		if (isBetter(state, best)) best = snapshot(state);
	}
	return snapshot(stateOf(task, best.inks));
}

/** Less missing first, then less moved; a trace left by adding and taking away counts as nothing. */
export function isBetter(one: Attempt, two: Attempt): boolean {
	if (Math.abs(one.missing - two.missing) > trace) return one.missing < two.missing;
	return one.move < two.move - trace;
}

function put(state: State, ink: number, place: Triple): void {
	state.inks[ink] = hexOfOklab(place);
	state.seen[ink] = appearanceOf(state.inks[ink]);
	state.places[ink] = oklabOf(state.inks[ink]);
}

function nudge(place: Triple, size: number, random: () => number): Triple {
	const [l, a, b] = place.map((value) => value + size * normalDeviate(random));
	return [l, a, b];
}

function between([first, last]: readonly [number, number], share: number): number {
	return first * (last / first) ** share;
}

/** What one ink misses with its neighbours and by its label, and how far it has moved. */
function inkCost(task: MendTask, state: State, ink: number): [missing: number, move: number] {
	let missing = labelShortfall(task.label, state.inks[ink]);
	for (const other of task.neighbours[ink]) {
		missing += shortfall(task.asks[ink][other], state.seen[ink], state.seen[other]);
	}
	return [missing, moveOf(task, ink, state.seen[ink])];
}

function stateOf(task: MendTask, from: readonly string[]): State {
	const seen = from.map(appearanceOf);
	const state: State = { inks: [...from], seen, places: from.map(oklabOf), missing: 0, move: 0 };
	from.forEach((hex, ink) => {
		state.missing += labelShortfall(task.label, hex);
		state.move += moveOf(task, ink, seen[ink]);
		for (const other of task.neighbours[ink]) {
			if (other > ink) state.missing += shortfall(task.asks[ink][other], seen[ink], seen[other]);
		}
	});
	return state;
}

function snapshot({ inks, missing, move }: State): Attempt {
	return { inks: [...inks], missing, move };
}
