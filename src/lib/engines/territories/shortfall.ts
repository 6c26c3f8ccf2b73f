import { slack, type Prepared } from './prepare.ts';
import type { Plan } from './problem.ts';

/** By how much a plan fails to keep the tolerances: its worst territory, and how many fail. */
export function shortfall({ problem, bound }: Prepared, { deviations }: Plan): string {
	let [over, territory, measure] = [slack, -1, -1];
	let count = 0;
	for (let t = 0; t < problem.territories.length; t++) {
		let outside = false;
		for (const m of bound) {
			const by = Math.abs(deviations[m][t]) - (problem.measures[m].tolerance ?? 0);
			if (by > slack) outside = true;
			if (by > over) [over, territory, measure] = [by, t, m];
		}
		if (outside) count++;
	}
	if (territory < 0) return '';
	const deviation = deviations[measure][territory];
	const of = bound.length > 1 ? ` for ${problem.measures[measure].name}` : '';
	const side = deviation > 0 ? 'over' : 'under';
	const more = count > 1 ? ` ${count} territories are outside.` : '';
	const allowed = problem.measures[measure].tolerance ?? 0;
	const stays = `Territory @${territory} stays ${percent(Math.abs(deviation), allowed)} ${side}`;
	return `${stays}${of}; ${percent(allowed)} is allowed.${more}`;
}

/** In tenths of a per cent, or thousandths where tenths would show `share` as just what is allowed. */
function percent(share: number, allowed = 0): string {
	const tenths = Math.round(share * 1000);
	const hides = allowed > 0 && tenths === Math.round(allowed * 1000);
	return `${hides ? Math.round(share * 100_000) / 1000 : tenths / 10} %`;
}
