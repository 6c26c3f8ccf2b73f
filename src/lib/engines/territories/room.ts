import { blockMayEndIn } from './block-rules.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible } from './problem.ts';
import { counted } from './words.ts';

/**
 * Whether every territory that stays can get a unit and every unit a territory, by counting and by the
 * rules on single units alone; null when it can.
 */
export function noRoom(prepared: Prepared): Impossible | null {
	return tooFewUnits(prepared) ?? emptyTerritory(prepared) ?? homelessUnit(prepared);
}

function tooFewUnits({ stays, blocks, units, problem }: Prepared): Impossible | null {
	const staying = Array.from(stays.keys()).filter((t) => stays[t]);
	if (blocks.length >= staying.length) return null;
	const tied = problem.together?.length ? ` in ${blocks.length} groups tied together` : '';
	const territories = counted(staying.length, 'territory that stays', 'territories that stay');
	return noPlan(
		`${territories} cannot each have one of ${counted(units, 'unit', 'units')}${tied}.`,
		[],
		staying,
	);
}

function emptyTerritory(prepared: Prepared): Impossible | null {
	const { fixed, stays, territories, problem } = prepared;
	const served = new Uint8Array(territories);
	for (let u = 0; u < fixed.length; u++) {
		const t = fixed[u] >= 0 ? fixed[u] : problem.today[u];
		if (t >= 0 && !served[t] && blockMayEndIn(prepared, u, t)) served[t] = 1;
	}
	for (let t = 0; t < territories; t++) {
		if (!stays[t] || served[t]) continue;
		if (fixed.some((_, u) => blockMayEndIn(prepared, u, t))) continue;
		const why = problem.territories[t].frozen
			? 'it is frozen without one'
			: prepared.steps
				? 'all are fixed elsewhere or out of reach'
				: 'all are fixed elsewhere';
		return noPlan(`@${t} stays but can get no unit: ${why}.`, [], [t]);
	}
	return null;
}

function homelessUnit(prepared: Prepared): Impossible | null {
	const { fixed, open, steps, problem, territories } = prepared;
	const anyOpen = open.includes(1);
	for (let u = 0; u < fixed.length; u++) {
		if (fixed[u] >= 0) continue;
		const own = problem.today[u];
		const tied = prepared.blocks[prepared.block[u]].length > 1;
		if (anyOpen && (!steps || own < 0 || open[own]) && !tied) continue;
		if (open.some((_, t) => t < territories && blockMayEndIn(prepared, u, t))) continue;
		const why = anyOpen
			? `no open territory lies within ${problem.reach} steps of it${tied ? ' and of the units it must stay together with' : ''}`
			: 'every territory that stays is frozen';
		return noPlan(`#${u} can end nowhere: ${why}.`, [u], []);
	}
	return null;
}

function noPlan(message: string, units: number[], territories: number[]): Impossible {
	return {
		status: 'impossible',
		reason: 'no-plan',
		message,
		witness: { units, territories },
		relief: [],
	};
}
