import { enoughInks, type Case } from './explain-case.ts';
import { CaseClauses } from './explain-clauses.ts';
import { immediateCollisions } from './explain-immediate.ts';
import type { Purse } from './explain-purse.ts';

/**
 * The smallest number of inks above the present one with which every demand and rule can be met, or
 * null when no number does. A number that the purse does
 * not suffice to tell about is passed over.
 */
export function inksThatWouldDo(of: Case, purse: Purse, seed: number): number | null {
	if (of.torn) return null;
	const most = enoughInks(of.graph, of.demands, of.bans);
	if (immediateCollisions({ ...of, inks: Math.max(of.inks, most) }).length > 0) return null;
	const everything = Uint32Array.from({ length: of.graph.count }, (_, v) => v);
	const highest = of.demands.reduce((ink, demand) => Math.max(ink, demand.ink), 0);
	for (let inks = Math.max(of.inks, highest) + 1; inks < most && !purse.empty; inks++) {
		const clauses = new CaseClauses({ ...of, inks }, everything, { seed });
		const demands = of.demands.keys();
		const answer = purse.pay(clauses.sat, (budget) => clauses.solve(demands, budget));
		if (answer === 'sat') return inks;
	}
	return of.inks < most ? most : null;
}
