import type { RegionGraph } from '../graph/region-graph.ts';
import { checkDrup } from '../solver/drup.ts';
import type { Proof } from './problem.ts';

/**
 * Whether a proof of kind `refutation` holds, told without the code that made it: its clauses are
 * written anew from the graph and every line is replayed. Out: what is wrong, in plain sentences;
 * nothing when it holds. Regions are vertices of `graph`.
 */
export function checkRefutation(graph: RegionGraph, proof: Proof): string[] {
	const { refutation, regions } = proof;
	if (!refutation || refutation.format !== 'drup') return ['The proof carries no refutation.'];
	if (new Set(regions).size !== regions.length) return ['A region is named twice.'];
	const known = (region: number) => Number.isInteger(region) && region >= 0 && region < graph.count;
	if (!regions.every(known)) return ['The proof names a region that does not exist.'];
	if (!Number.isInteger(refutation.inks) || refutation.inks < 0)
		return ['No number of inks is given.'];
	const { valid, reason } = checkDrup(
		plainClauses(graph, regions, refutation.inks),
		refutation.clauses,
	);
	return valid ? [] : [`The refutation does not hold: ${reason}.`];
}

function plainClauses(graph: RegionGraph, regions: number[], inks: number): number[][] {
	const place = new Map(regions.map((region, index) => [region, index]));
	const clauses: number[][] = [];
	regions.forEach((region, i) => {
		clauses.push(Array.from({ length: inks }, (_, ink) => i * inks + ink + 1));
		for (let e = graph.offsets[region]; e < graph.offsets[region + 1]; e++) {
			const j = place.get(graph.targets[e]);
			if (j === undefined || j <= i) continue;
			for (let ink = 1; ink <= inks; ink++) clauses.push([-(i * inks + ink), -(j * inks + ink)]);
		}
	});
	return clauses;
}
