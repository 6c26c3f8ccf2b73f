import { readFileSync } from 'node:fs';

/** Graphs by formula and from files, as lists of edges on vertices from 0. */
export interface EdgeList {
	regions: number;
	borders: { a: number[]; b: number[] };
}

export function fromPairs(
	regions: number,
	pairs: readonly (readonly [number, number])[],
): EdgeList {
	return { regions, borders: { a: pairs.map((p) => p[0]), b: pairs.map((p) => p[1]) } };
}

/** Reads a graph in the DIMACS .col form from the fixtures. */
export function fixtureGraph(name: string): EdgeList {
	return edgesOfCol(
		readFileSync(new URL(`../fixtures/graphs/${name}.col`, import.meta.url), 'utf8'),
	);
}

/** The graph that a file in the DIMACS .col form says. */
export function edgesOfCol(text: string): EdgeList {
	const lines = text.split('\n');
	const regions = Number(lines.find((line) => line.startsWith('p '))?.split(/\s+/)[2]);
	const pairs = lines
		.filter((line) => line.startsWith('e '))
		.map((line) => line.split(/\s+/).slice(1, 3).map(Number))
		.map(([a, b]) => [a - 1, b - 1] as const);
	return fromPairs(regions, pairs);
}

/** Joins i < j wherever `joined` says so. */
export function byRule(regions: number, joined: (i: number, j: number) => boolean): EdgeList {
	const pairs: [number, number][] = [];
	for (let i = 0; i < regions; i++) {
		for (let j = i + 1; j < regions; j++) if (joined(i, j)) pairs.push([i, j]);
	}
	return fromPairs(regions, pairs);
}

export const complete = (n: number) => byRule(n, () => true);

export const cycle = (n: number) => byRule(n, (i, j) => j - i === 1 || (i === 0 && j === n - 1));

/** Squares of an n x n board, joined when a queen moves between them. */
export const queens = (n: number) =>
	byRule(n * n, (i, j) => {
		const rows = Math.abs(Math.floor(i / n) - Math.floor(j / n));
		const columns = Math.abs((i % n) - (j % n));
		return rows === 0 || columns === 0 || rows === columns;
	});

/** k-subsets of n things, joined when they share nothing (M. Kneser 1955). */
export function kneser(n: number, k: number): EdgeList {
	const subsets: number[] = [];
	for (let set = 0; set < 1 << n; set++) {
		let size = 0;
		for (let rest = set; rest; rest &= rest - 1) size++;
		if (size === k) subsets.push(set);
	}
	return byRule(subsets.length, (i, j) => (subsets[i] & subsets[j]) === 0);
}

/** J. Mycielski's construction, Colloq. Math. 3 (1955): one ink more, no new triangle. */
export function mycielski({ regions, borders }: EdgeList): EdgeList {
	const pairs: [number, number][] = [];
	borders.a.forEach((a, i) => {
		const b = borders.b[i];
		pairs.push([a, b], [a, regions + b], [b, regions + a]);
	});
	for (let v = 0; v < regions; v++) pairs.push([regions + v, 2 * regions]);
	return fromPairs(2 * regions + 1, pairs);
}

/** Every vertex of one graph joined to every vertex of the other. */
export function join(left: EdgeList, right: EdgeList): EdgeList {
	const n = left.regions;
	const a = [...left.borders.a, ...right.borders.a.map((v) => v + n)];
	const b = [...left.borders.b, ...right.borders.b.map((v) => v + n)];
	for (let i = 0; i < n; i++) {
		for (let j = 0; j < right.regions; j++) {
			a.push(i);
			b.push(n + j);
		}
	}
	return { regions: n + right.regions, borders: { a, b } };
}
