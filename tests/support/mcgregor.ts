import { fromPairs, type EdgeList } from './named-graphs.ts';

/**
 * W. McGregor's map of order n as a graph (M. Gardner, Scientific American, April 1975, shows order 10 as
 * an April fool's joke; D. E. Knuth, The Art of Computer Programming 7.2.2.2, names and generalises it):
 * n(n+1) regions (j, k) with 0 <= j <= n and 0 <= k < n, numbered j * n + k, and 3n(n+1) - 6 borders.
 */
export function mcgregor(n: number): EdgeList {
	const pairs: [number, number][] = [];
	const join = (j: number, k: number, row: number, column: number) =>
		pairs.push([j * n + k, row * n + column]);
	for (let j = 0; j <= n; j++) {
		for (let k = 0; k < n; k++) {
			if (j === 1 && k === 0) continue;
			courses(n, j, k, join);
			turns(n, j, k, join);
		}
	}
	// the two long regions of the corner share the last course between them
	join(0, 0, 1, 0);
	for (let column = 1; column <= n; column++) {
		if (column <= n >> 1) join(0, 0, n, column);
		if (column >= n >> 1 && column < n) join(1, 0, n, column);
	}
	return fromPairs(n * (n + 1), pairs);
}

type Join = (j: number, k: number, row: number, column: number) => void;

/** Bricks: each borders two of the next course and the next in its own, but not across the staircase. */
function courses(n: number, j: number, k: number, join: Join): void {
	const [below, beside] = [j < n, k < n - 1];
	if (below && beside) join(j, k, j + 1, k + 1);
	if (below && j !== k) join(j, k, j + 1, k);
	if (beside && j !== k + 1) join(j, k, j, k + 1);
}

/** Where the courses turn: the staircase meets the first column, the last column itself, the first row the end. */
function turns(n: number, j: number, k: number, join: Join): void {
	const last = k === n - 1;
	if (j === 0) join(j, k, n, n - 1);
	if (j === k && !last) join(j, k, n - j, 0);
	if (j === k && j > 0) join(j, k, n + 1 - j, 0);
	if (last && j > 0 && j < k) join(j, k, n - j, n - j - 1);
	if (last && j > 0 && j < n) join(j, k, n + 1 - j, n - j);
}
