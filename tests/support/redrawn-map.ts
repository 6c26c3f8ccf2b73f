import { colour } from '../../src/lib/engines/colouring/colour.ts';
import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';
import { Random } from '../../src/lib/engines/colouring/random.ts';
import { buildGraph, isPlanar } from '../../src/lib/engines/graph/index.ts';
import type { AnyMap } from './adversary.ts';

/**
 * A map, a colouring of it with four inks, and so many of its borders redrawn: where two regions met, the two
 * beside them meet instead, which have one ink; a planar map stays planar. Asked for: four inks with as few
 * changes as can be.
 */
export async function redrawnMap(
	map: AnyMap,
	clashes: number,
	seed: number,
): Promise<ColouringProblem> {
	const earlier = await colour({ ...map, inks: 4, seed });
	if (earlier.status !== 'coloured') throw new Error(earlier.status);
	const beside: Set<number>[] = Array.from({ length: map.regions }, () => new Set());
	const { a, b } = map.borders;
	for (let i = 0; i < a.length; i++) join(beside, a[i], b[i]);
	const random = new Random(seed);
	for (let left = clashes; left > 0;) {
		const i = random.below(a.length);
		if (redraw(beside, a[i], b[i], earlier.colouring)) left--;
	}
	const borders = listed(beside);
	if (planar(map) && !planar({ ...map, borders })) throw new Error('not planar any more');
	const previous = earlier.colouring;
	return { regions: map.regions, borders, inks: 4, previous, goal: 'fewest-changes' };
}

const planar = ({ regions, borders }: AnyMap) =>
	isPlanar(buildGraph(regions, borders.a, borders.b));

function join(beside: Set<number>[], u: number, v: number): void {
	beside[u].add(v);
	beside[v].add(u);
}

/** Whether the border between u and v could be given to the two regions of one ink that lie at its ends. */
function redraw(beside: Set<number>[], u: number, v: number, inks: Int32Array): boolean {
	if (!beside[u].has(v)) return false;
	const ends = [...beside[u]].filter((w) => beside[v].has(w));
	if (ends.length !== 2) return false;
	const [p, q] = ends;
	if (beside[p].has(q) || inks[p] !== inks[q]) return false;
	beside[u].delete(v);
	beside[v].delete(u);
	join(beside, p, q);
	return true;
}

function listed(beside: Set<number>[]) {
	const a: number[] = [];
	const b: number[] = [];
	beside.forEach((others, u) => {
		for (const v of others) {
			if (v < u) continue;
			a.push(u);
			b.push(v);
		}
	});
	return { a, b };
}
