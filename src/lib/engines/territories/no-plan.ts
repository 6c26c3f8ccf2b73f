import { provesInfeasible } from '../solver/program-certificates.ts';
import { solveProgram } from '../solver/program.ts';
import { boundProgram } from './bound-program.ts';
import { boundTerms } from './bound-terms.ts';
import type { DeadEnd } from './exact-choices.ts';
import { exactLimits, isSmall } from './exact-size.ts';
import { solveExact } from './exact.ts';
import { reliefByBest, smallReliefs } from './no-plan-relief.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible, Relief, Watch } from './problem.ts';
import { listed, listedTerritories, percentUp } from './words.ts';

/**
 * Proves that no plan keeps the rules, where it can, with the smallest change that would help: small
 * problems exactly; larger ones where not even the program of every plan's moves without whole numbers
 * can be met (its infeasibility is checked by weights on its rows). `best` is the plan that came nearest,
 * true to everything but tolerances; what it shows possible is a relief.
 * @returns null when nothing is proved, which does not mean that there is a plan
 */
export async function noPlan(
	prepared: Prepared,
	best: Int32Array | null,
	watch: Watch = {},
): Promise<Impossible | null> {
	if (!isSmall(prepared)) return byPrices(prepared, best, watch);
	const outcome = await solveExact(prepared, { least: 'moves' }, exactLimits(prepared, watch));
	if (outcome.status !== 'infeasible') return null;
	return explainSmall(prepared, best, outcome.deadEnd, watch);
}

/** The answer for a small problem known to have no plan: who is to blame and what would help. */
export async function explainSmall(
	prepared: Prepared,
	best: Int32Array | null,
	deadEnd: DeadEnd | null,
	watch: Watch,
): Promise<Impossible> {
	const relief = await smallReliefs(prepared, best, watch);
	if (deadEnd?.dead === 'block') {
		const units = prepared.blocks[deadEnd.block];
		const message = `${listed(units)} can end in no territory: none may take it, is joined to it and has room.`;
		return impossible(prepared, message, { units, territories: [] }, relief);
	}
	const territories = deadEnd ? [deadEnd.territory] : await blamed(prepared, watch);
	const names = listedTerritories(territories);
	const together = territories.length > 1 ? ' at once' : '';
	const message =
		`No plan brings ${names} within tolerance, in one piece and true to the rules${together}: ` +
		(deadEnd ? 'the units it could be joined to do not suffice.' : 'every way has been ruled out.');
	return impossible(prepared, message, { units: [], territories }, relief);
}

function impossible(
	{ problem }: Prepared,
	message: string,
	witness: Impossible['witness'],
	relief: Relief[],
): Impossible {
	const words = relief.map((one) => {
		if (one.kind === 'tolerance') {
			return `a tolerance of ${percentUp(one.value)} for ${problem.measures[one.measure].name} would do`;
		}
		if (one.kind === 'unlock') return `unlocking #${one.unit} would do`;
		if (one.kind === 'unfreeze') return `unfreezing @${one.territory} would do`;
		return `splitting #${one.unit} would do`;
	});
	const help = words.length > 0 ? ` What helps: ${words.join('; ')}.` : '';
	return { status: 'impossible', reason: 'no-plan', message: message + help, witness, relief };
}

/** Territories that cannot all come right, whatever the others do; none of them can be left out. */
async function blamed(prepared: Prepared, watch: Watch): Promise<number[]> {
	const { stays, territories } = prepared;
	let left = Array.from({ length: territories }, (_, t) => t).filter((t) => stays[t]);
	const limits = exactLimits(prepared, watch, 0.05);
	for (const t of [...left]) {
		const others = left.filter((other) => other !== t);
		if (others.length === 0 || watch.cancelled?.()) break;
		const judged = (territory: number) => others.includes(territory);
		const outcome = await solveExact(prepared, { least: 'moves' }, limits, { judged });
		if (outcome.status === 'infeasible') left = others;
	}
	return left;
}

async function byPrices(
	prepared: Prepared,
	best: Int32Array | null,
	watch: Watch,
): Promise<Impossible | null> {
	const { program, loadRows } = boundProgram(prepared, boundTerms(prepared), 1);
	const relaxed = {
		...program,
		cost: program.cost.map(() => 0),
		integer: program.integer.map(() => 0),
	};
	const outcome = await solveProgram(relaxed, {
		cancelled: watch.cancelled,
		iterations: 2_000_000,
	});
	if (outcome.status !== 'infeasible' || !outcome.ray) return null;
	if (!provesInfeasible(relaxed, outcome.ray)) return null;
	const most = outcome.ray.reduce((a, b) => Math.max(a, Math.abs(b)), 0);
	const territories = [...loadRows]
		.filter(([row]) => Math.abs(outcome.ray![row]) > 1e-6 * most)
		.map(([, t]) => t);
	const unique = [...new Set(territories)].sort((a, b) => a - b);
	const rule = prepared.steps ? ` within ${prepared.problem.reach} steps` : '';
	const message =
		`What ${listedTerritories(unique)} can take and give${rule} does not bring all of them within ` +
		'tolerance, even if units could be divided.';
	const relief = reliefByBest(prepared, best);
	return impossible(prepared, message, { units: [], territories: unique }, relief);
}
