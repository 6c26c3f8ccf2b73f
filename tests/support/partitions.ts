/**
 * All plans of a small territory problem, by trying: no code is shared with the engines. A set of units
 * is a number whose bit u stands for unit u; at most 25 units.
 */
export interface SmallProblem {
	units: number;
	/** one list of sets a territory: what it may hold */
	sets: number[][];
}

export function neighbourMasks(units: number, pairs: readonly (readonly [number, number])[]) {
	const masks = new Array<number>(units).fill(0);
	for (const [a, b] of pairs) {
		masks[a] |= 1 << b;
		masks[b] |= 1 << a;
	}
	return masks;
}

/** Whether the units of a set are joined among themselves; the empty set is not. */
export function inOnePiece(set: number, neighbours: number[]): boolean {
	if (set === 0) return false;
	let reached = set & -set;
	for (let front = reached; front !== 0;) {
		let next = 0;
		for (let rest = front; rest !== 0; rest &= rest - 1)
			next |= neighbours[31 - Math.clz32(rest & -rest)];
		front = next & set & ~reached;
		reached |= front;
	}
	return reached === set;
}

/** Every way to give each territory one of its sets so that each unit is held once. */
export function* plansOf({ units, sets }: SmallProblem): Generator<number[]> {
	const all = 2 ** units - 1;
	const last = new Set(sets[sets.length - 1]);
	const held: number[] = [];
	function* give(territory: number, free: number): Generator<number[]> {
		if (territory === sets.length - 1) {
			if (last.has(free)) yield [...held, free];
			return;
		}
		for (const set of sets[territory]) {
			if ((set & free) !== set) continue;
			held.push(set);
			yield* give(territory + 1, free & ~set);
			held.pop();
		}
	}
	yield* give(0, all);
}

export function gridPairs(rows: number, columns: number): [number, number][] {
	const pairs: [number, number][] = [];
	for (let r = 0; r < rows; r++) {
		for (let c = 0; c < columns; c++) {
			if (c + 1 < columns) pairs.push([r * columns + c, r * columns + c + 1]);
			if (r + 1 < rows) pairs.push([r * columns + c, (r + 1) * columns + c]);
		}
	}
	return pairs;
}

/**
 * How many ways there are to part an n by n grid (rook neighbours) into n connected parts of n cells,
 * and the fewest cut borders among them. The lowest free cell names the next part, so that no partition
 * is counted twice. `visit` sees each: the part of every cell, parts numbered by their lowest cell.
 */
export function equalParts(
	n: number,
	visit: (part: Int8Array) => void = () => {},
): { count: number; fewestCuts: number } {
	const pairs = gridPairs(n, n);
	const near: number[][] = Array.from({ length: n * n }, () => []);
	for (const [a, b] of pairs) {
		near[a].push(b);
		near[b].push(a);
	}
	const part = new Int8Array(n * n).fill(-1);
	let count = 0;
	let fewestCuts = Infinity;
	const next = (parts: number): void => {
		const first = part.indexOf(-1);
		if (first < 0) {
			count++;
			visit(part);
			fewestCuts = Math.min(fewestCuts, pairs.filter(([a, b]) => part[a] !== part[b]).length);
			return;
		}
		grow([first], 0, new Set([first]), parts);
	};
	/** Redelmeier's method: each connected set that holds the first cell once. */
	const grow = (open: number[], size: number, seen: Set<number>, parts: number): void => {
		const rest = [...open];
		while (rest.length > 0) {
			const cell = rest.pop()!;
			part[cell] = parts;
			if (size + 1 === n) {
				if (restFits(part, near, n)) next(parts + 1);
			} else {
				const fresh = near[cell].filter((other) => part[other] < 0 && !seen.has(other));
				grow([...rest, ...fresh], size + 1, new Set([...seen, ...fresh]), parts);
			}
			part[cell] = -1;
		}
	};
	next(0);
	return { count, fewestCuts };
}

/** Whether every piece of free cells has a whole number of parts in it. */
function restFits(part: Int8Array, near: number[][], n: number): boolean {
	const seen = new Uint8Array(part.length);
	for (let start = 0; start < part.length; start++) {
		if (part[start] >= 0 || seen[start]) continue;
		const piece = [start];
		seen[start] = 1;
		for (const cell of piece) {
			for (const other of near[cell]) {
				if (part[other] >= 0 || seen[other]) continue;
				seen[other] = 1;
				piece.push(other);
			}
		}
		if (piece.length % n !== 0) return false;
	}
	return true;
}
