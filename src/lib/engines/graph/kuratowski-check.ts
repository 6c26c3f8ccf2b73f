import type { RegionGraph } from './region-graph.ts';

/**
 * A subdivision of K5 or K3,3 in a graph: why it cannot be drawn without crossings. `paths` run from
 * hub to hub, ends included. Of the six hubs of K3,3 the first three are joined to the last three.
 */
export interface KuratowskiWitness {
	kind: 'K5' | 'K3,3';
	hubs: number[];
	paths: number[][];
}

/**
 * What is wrong with a witness, in plain sentences; empty when it holds. Shares no code with the search.
 *
 * Source: K. Kuratowski, Sur le problème des courbes gauches en topologie, Fund. Math. 15 (1930).
 */
export function checkKuratowski(graph: RegionGraph, witness: KuratowskiWitness): string[] {
	const { kind, hubs, paths } = witness;
	const wanted = kind === 'K5' ? 5 : 6;
	const errors: string[] = [];
	if (hubs.length !== wanted || new Set(hubs).size !== wanted) errors.push('Wrong number of hubs.');
	const missing = new Set(pairsOf(kind, hubs));
	for (const path of paths) {
		const ends = nameOf(path[0], path[path.length - 1]);
		if (!missing.delete(ends)) errors.push(`Path ${ends} is not wanted, or is there twice.`);
		errors.push(...brokenSteps(graph, path));
	}
	for (const ends of missing) errors.push(`Path ${ends} is missing.`);
	const inner = paths.flatMap((path) => path.slice(1, -1));
	const meeting = new Set([...hubs, ...inner]).size !== hubs.length + inner.length;
	if (meeting) errors.push('Paths meet outside their ends.');
	return errors;
}

const nameOf = (a: number, b: number) => `${Math.min(a, b)}-${Math.max(a, b)}`;

function pairsOf(kind: 'K5' | 'K3,3', hubs: number[]): string[] {
	const joined = (i: number, j: number) => i < j && (kind === 'K5' || (i < 3 && j >= 3));
	return hubs.flatMap((a, i) => hubs.filter((_, j) => joined(i, j)).map((b) => nameOf(a, b)));
}

function brokenSteps({ offsets, targets }: RegionGraph, path: number[]): string[] {
	const errors: string[] = [];
	for (let i = 1; i < path.length; i++) {
		const row = targets.subarray(offsets[path[i - 1]], offsets[path[i - 1] + 1]);
		if (!row.includes(path[i])) errors.push(`${path[i - 1]} and ${path[i]} do not border.`);
	}
	return errors;
}
