import { readHex } from '../colour/hex.ts';
import { readers } from '../colour/reader.ts';
import { labelContrastAsked, judgeLabel } from './check.ts';
import { appearanceOf, found } from './appearance.ts';
import { hatchesTell } from './hatch-tells.ts';
import { mendTask, type MendTask, type PairAsk } from './mend-cost.ts';
import { lockedInks, movesBetween } from './mend.ts';
import { bestForGrey, fromKnownSet, leastMovement } from './mend-kinds.ts';
import type { Attempt } from './mend-search.ts';
import { smallestMend } from './mend-sets.ts';
import { whyImpossible, whyNotFound } from './mend-reasons.ts';
import type { AskedOfInks } from './pair-demands.ts';
import type { Ink, Palette } from './palette.ts';
import { randomStream } from './random.ts';

/** What a proposal puts first. */
export const proposalKinds = ['fewest', 'least', 'grey', 'known'] as const;
export type ProposalKind = (typeof proposalKinds)[number];

export interface ProposalRequest {
	inks: readonly Ink[];
	/** what is asked of each pair that touches on the sheet, as `pairDemands` finds it */
	demands: readonly AskedOfInks[];
	/** numbers of the inks that stay as they are */
	locked: readonly number[];
	/** sets that `known` may start from: published ones, the house's, the team's */
	known: readonly Palette[];
	seed?: number;
}

export interface Proposal {
	kind: ProposalKind;
	/** the mended inks, hex digits */
	inks: string[];
	/** CIEDE2000 for a typical reader, 0 for an ink that stayed */
	moves: number[];
	moved: number;
	total: number;
	/** least CIEDE2000 over the four kinds of eyesight, and least gap in L*, of pairs that touch */
	least: number;
	leastGrey: number;
	/** name of the set it was started from, for `known` */
	from?: string;
}

export type ProposalAnswer =
	| { status: 'not-needed' }
	| { status: 'impossible'; reason: string }
	| { kind: ProposalKind; status: 'proposed'; proposal: Proposal }
	| { kind: ProposalKind; status: 'not-found'; reason: string };

/**
 * Mends of a palette for one sheet, each putting something else first: the fewest inks moved; the least
 * movement in all; the widest gaps for grey print (8 in L* and more, where found); a well-known set laid on
 * the inks that may move. Answered one by one, so that the first can be looked at while others are sought.
 *
 * Guarantee: every proposal passes `meetsDemands` on its new inks, and locked inks are untouched. That no
 * better one exists is not proved. `impossible` is certain and comes alone, as does `not-needed`.
 * Deterministic for a seed; the effort is counted in steps. Throws a RangeError on locks that are no inks.
 */
export function* proposeMends(request: ProposalRequest): Generator<ProposalAnswer> {
	const inks = request.inks.map(({ hex }) => readHex(hex) ?? hex);
	const locked = lockedInks(inks.length, request.locked);
	if (meetsDemands(request.inks, inks, request.demands)) return yield { status: 'not-needed' };
	const task = taskOf(request, inks, true);
	const reason = whyImpossible(task, locked);
	if (reason) return yield { status: 'impossible', reason };
	yield* proposals(request, task, locked);
}

function* proposals(
	request: ProposalRequest,
	task: MendTask,
	locked: readonly number[],
): Generator<ProposalAnswer> {
	// the lines of a hatch may stop showing on a fill that moved: then the fills must do without
	const byFill = task.pairs.some(({ told }) => told) ? taskOf(request, task.inks, false) : null;
	const few = smallestMend(task, locked, randomStream(request.seed ?? 0));
	const fewByFill = byFill && smallestMend(byFill, locked, randomStream(request.seed ?? 0));
	for (const kind of proposalKinds) {
		const proposal =
			searched(request, kind, task, locked, few) ??
			(byFill && searched(request, kind, byFill, locked, fewByFill));
		yield proposal
			? { kind, status: 'proposed', proposal }
			: { kind, status: 'not-found', reason: whyNotFound(task, locked) };
	}
}

const searches: Record<ProposalKind, typeof leastMovement> = {
	fewest: (_task, _locked, { few }) => few && { inks: few.inks },
	least: leastMovement,
	grey: bestForGrey,
	known: fromKnownSet,
};

function searched(
	request: ProposalRequest,
	kind: ProposalKind,
	task: MendTask,
	locked: readonly number[],
	few: Attempt | null,
): Proposal | null {
	const random = randomStream((request.seed ?? 0) + proposalKinds.indexOf(kind));
	const result = searches[kind](task, locked, { random, known: request.known, few });
	if (!result || !meetsDemands(request.inks, result.inks, request.demands)) return null;
	if (locked.some((ink) => result.inks[ink] !== task.inks[ink])) return null;
	const moves = movesBetween(task.inks, result.inks);
	return {
		...{ kind, inks: result.inks, moves },
		moved: moves.filter((move) => move > 0).length,
		total: moves.reduce((sum, move) => sum + move, 0),
		...leastOf(result.inks, request.demands),
		...(result.from ? { from: result.from } : {}),
	};
}

function taskOf(request: ProposalRequest, inks: readonly string[], hatches: boolean): MendTask {
	const names = request.inks.map(({ name }, ink) => name || `Ink ${ink + 1}`);
	const pairs = request.demands.map(({ a, b, ciede2000, grey, sizesMm }): PairAsk => {
		const told = readers.filter((reader) =>
			hatchesTell(request.inks[a], request.inks[b], reader, sizesMm),
		);
		return { a, b, ciede2000, grey, ...(hatches && told.length ? { told } : {}) };
	});
	return mendTask(inks, names, pairs, labelContrastAsked);
}

/**
 * Whether inks of these colours keep what is asked of every pair and of every label. Shares nothing with
 * the search but the measures themselves.
 */
export function meetsDemands(
	inks: readonly Ink[],
	hexes: readonly string[],
	demands: readonly AskedOfInks[],
): boolean {
	const fills = inks.map((ink, number) => ({ ...ink, hex: hexes[number] }));
	const seen = hexes.map(appearanceOf);
	if (!hexes.every((hex, ink) => judgeLabel(hex, ink, labelContrastAsked).passes)) return false;
	return demands.every(({ a, b, ciede2000, grey, sizesMm }) =>
		readers.every((reader) => {
			const value = found(reader, seen[a], seen[b]);
			if (value >= (reader === 'grey' ? grey : ciede2000)) return true;
			return hatchesTell(fills[a], fills[b], reader, sizesMm);
		}),
	);
}

function leastOf(
	hexes: readonly string[],
	demands: readonly AskedOfInks[],
): Pick<Proposal, 'least' | 'leastGrey'> {
	const seen = hexes.map(appearanceOf);
	const of = (grey: boolean) =>
		Math.min(
			...demands.flatMap(({ a, b }) =>
				readers
					.filter((reader) => (reader === 'grey') === grey)
					.map((reader) => found(reader, seen[a], seen[b])),
			),
		);
	return { least: of(false), leastGrey: of(true) };
}
