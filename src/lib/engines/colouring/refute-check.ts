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
	const clauses = plainClauses(graph, proof, refutation.inks);
	if (!clauses) return ['The proof names a border that does not exist.'];
	const { valid, reason } = checkDrup(clauses, refutation.clauses);
	return valid ? [] : [`The refutation does not hold: ${reason}.`];
}

/** Null when the proof leans on a border that the graph does not have. */
function plainClauses(graph: RegionGraph, { regions, borders }: Proof, inks: number) {
	const place = new Map(regions.map((region, index) => [region, index]));
	const wanted = borders && new Set(borders.flatMap(([a, b]) => [`${a} ${b}`, `${b} ${a}`]));
	const clauses: number[][] = [];
	let found = 0;
	regions.forEach((region, i) => {
		clauses.push(Array.from({ length: inks }, (_, ink) => i * inks + ink + 1));
		for (let e = graph.offsets[region]; e < graph.offsets[region + 1]; e++) {
			const j = place.get(graph.targets[e]);
			if (j === undefined || j <= i) continue;
			if (wanted && !wanted.has(`${region} ${graph.targets[e]}`)) continue;
			found++;
			for (let ink = 1; ink <= inks; ink++) clauses.push([-(i * inks + ink), -(j * inks + ink)]);
		}
	});
	return wanted && 2 * found !== wanted.size ? null : clauses;
}
