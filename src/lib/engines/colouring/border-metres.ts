import type { Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

/** Metres shared by the ends of each entry of `targets`; 1 for each border when none are given. */
export function metresOf(problem: ColouringProblem, { graph, vertexOf }: Prepared): Float64Array {
	const { offsets, targets } = graph;
	const metres = new Float64Array(targets.length);
	const { a, b } = problem.borders;
	const add = (u: number, v: number, length: number) => {
		const place = targets.subarray(offsets[u], offsets[u + 1]).indexOf(v);
		if (place >= 0) metres[offsets[u] + place] += length;
	};
	for (let i = 0; i < a.length; i++) {
		const length = problem.lengths ? problem.lengths[i] : 1;
		add(vertexOf[a[i]], vertexOf[b[i]], length);
		add(vertexOf[b[i]], vertexOf[a[i]], length);
	}
	return metres;
}
