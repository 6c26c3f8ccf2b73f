import { blockMayEndIn, fixedUnits } from './block-rules.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Impossible, Relief, TerritoryProblem } from './problem.ts';
import { thatHelp } from './relieve.ts';
import { amount, listed, percentUp } from './words.ts';

/**
 * Units that must end together and are heavier than every territory in which they may end allows: one
 * unit, units tied together, or all that is fixed to one territory. Null when there are none.
 */
export function tooHeavy(prepared: Prepared): Impossible | null {
	const fault = find(prepared);
	if (!fault) return null;
	const again = (eased: TerritoryProblem) => {
		const next = prepare(eased);
		return 'status' in next ? next : find(next);
	};
	const unlocks = unlocking(prepared, fault);
	return {
		...fault,
		relief: [...fault.relief, ...thatHelp(prepared.problem, fault, unlocks, again)],
	};
}

function find(prepared: Prepared): Impossible | null {
	const { blocks, fixed, stays, territories, open } = prepared;
	const allowed = allowedEverywhere(prepared);
	for (const units of blocks) {
		const isLight = allowed.every((most, row) => loadOf(prepared, row, units) <= most);
		if (isLight || fixed[units[0]] >= 0) continue;
		const where: number[] = [];
		for (let t = 0; t < territories; t++) if (blockMayEndIn(prepared, units[0], t)) where.push(t);
		const fault = where.length > 0 && heavyIn(prepared, units, where);
		if (fault) return fault;
	}
	const pinned = fixedUnits(prepared);
	for (let t = 0; t < territories; t++) {
		if (!stays[t] || !open[t] || pinned[t].length === 0) continue;
		const fault = heavyIn(prepared, pinned[t], [t]);
		if (fault) return fault;
	}
	return null;
}

const loadOf = ({ loads, units: count }: Prepared, row: number, units: number[]) =>
	units.reduce((sum, u) => sum + loads[row * count + u], 0);

/** The least that any territory which stays allows, by measure: a quick yes for nearly all units. */
function allowedEverywhere({ bound, stays, greatest, territories }: Prepared): number[] {
	return bound.map((_, row) => {
		let least = Infinity;
		for (let t = 0; t < territories; t++) {
			if (stays[t]) least = Math.min(least, greatest[row * territories + t]);
		}
		return least;
	});
}

function heavyIn(prepared: Prepared, units: number[], where: number[]): Impossible | null {
	const { bound, targets, greatest, territories, problem } = prepared;
	const eased = new Map<number, number>();
	let example = '';
	for (const t of where) {
		const over = bound.flatMap((_, row) =>
			loadOf(prepared, row, units) > greatest[row * territories + t] ? [row] : [],
		);
		if (over.length === 0) return null;
		const [row] = over;
		const at = row * territories + t;
		const load = loadOf(prepared, row, units);
		const needed = load / targets[at] - 1;
		const { name } = problem.measures[bound[row]];
		if (!example || needed < (eased.get(row) ?? Infinity)) {
			example = `${amount(load)} of ${name}, and @${t} may have ${amount(greatest[at])} at most`;
		}
		if (over.length === 1) eased.set(row, Math.min(needed, eased.get(row) ?? Infinity));
	}
	const relief: Relief[] = [...eased].map(([row, value]) => {
		return { kind: 'tolerance', measure: bound[row], value };
	});
	const would = [...eased].map(
		([row, value]) =>
			`a tolerance of ${percentUp(value)} for ${problem.measures[bound[row]].name} would do`,
	);
	if (units.length === 1) relief.push({ kind: 'split', unit: units[0] });
	return {
		status: 'impossible',
		reason: 'unit-too-heavy',
		message: [`${subject(units, where)} ${example}`, ...would].join('; ') + '.',
		witness: { units, territories: where },
		relief,
	};
}

function subject(units: number[], where: number[]): string {
	const may = where.length > 1 ? `, which may end in ${where.length} territories,` : '';
	if (units.length === 1) return `#${units[0]}${may} has`;
	const tie = where.length > 1 ? 'which must stay together' : `which are tied to @${where[0]}`;
	return `${listed(units)}, ${tie}, have`;
}

/** Locks without any one of which the others would be within what the territory allows. */
function unlocking(
	{ problem, bound, loads, greatest, territories, ...rest }: Prepared,
	fault: Impossible,
) {
	const { units, territories: where } = fault.witness;
	const isLight = (unit: number) =>
		bound.every((_, row) => {
			const others = units.filter((u) => u !== unit);
			const load = others.reduce((sum, u) => sum + loads[row * rest.units + u], 0);
			return load <= greatest[row * territories + where[0]];
		});
	const locked = units.filter((unit) => (problem.locks?.[unit] ?? -1) === where[0]);
	return locked.filter(isLight).map((unit): Relief => ({ kind: 'unlock', unit }));
}
