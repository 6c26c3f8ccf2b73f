import type { Cells } from './cells.ts';
import { districtGraph, districtMiddles } from './provinces.ts';

/** A city inside one district: a cell and its neighbours well within that district become district `city`. */
export function carveEnclave(cells: Cells, owner: Int32Array, city: number): number {
	const deep = (cell: number, rings: number): boolean =>
		rings === 0 ||
		(cells.neighbours[cell].length === cells.rims[cell].length &&
			cells.neighbours[cell].every((n) => owner[n] === owner[cell] && deep(n, rings - 1)));
	const heart = cells.centres
		.map((centre, cell) => ({ cell, off: Math.hypot(centre[0] - 28, centre[1] + 18) }))
		.filter(({ cell }) => owner[cell] >= 0 && deep(cell, 2))
		.sort((a, b) => a.off - b.off)[0];
	if (!heart) throw new Error('No district is roomy enough for an enclave');
	const host = owner[heart.cell];
	for (const cell of [heart.cell, ...cells.neighbours[heart.cell]]) owner[cell] = city;
	return host;
}

/**
 * An exclave: a few cells on the border of two districts go to a third that touches neither, so that
 * it has a part cut off from its main one. Returns the number of the third.
 */
export function carveExclave(cells: Cells, owner: Int32Array, count: number): number {
	const graph = districtGraph(cells, owner, count);
	const middles = districtMiddles(cells, owner, count);
	for (const [cell, [x, y]] of cells.centres.entries()) {
		if (owner[cell] < 0 || Math.hypot(x - 100, y - 60) > 60) continue;
		const patch = [cell, ...cells.neighbours[cell]];
		const hosts = new Set(patch.map((one) => owner[one]));
		const round = new Set(patch.flatMap((one) => cells.neighbours[one].map((n) => owner[n])));
		if (hosts.size !== 2 || round.size !== 2 || round.has(-1)) continue;
		const near = new Set([...hosts].flatMap((host) => [host, ...graph[host]]));
		const third = [...near]
			.flatMap((district) => graph[district])
			.filter((district) => !near.has(district))
			.sort((a, b) => distance(middles[a], [x, y]) - distance(middles[b], [x, y]) || a - b)[0];
		if (third === undefined) continue;
		for (const one of patch) owner[one] = third;
		return third;
	}
	throw new Error('No place for an exclave');
}

function distance(a: readonly number[], b: readonly number[]): number {
	return Math.hypot(a[0] - b[0], a[1] - b[1]);
}

/**
 * The point where four districts meet. Two districts that share one short side of the mosaic only are
 * parted at it: the side shrinks to its middle. Returns the two vertices that become one.
 */
export function findFourCorner(cells: Cells, owner: Int32Array, count: number): [number, number] {
	const graph = districtGraph(cells, owner, count);
	const sides = new Map<string, [number, number][]>();
	const around = cells.vertices.map(() => new Set<number>());
	cells.rims.forEach((rim, cell) => {
		rim.forEach((from, i) => {
			around[from].add(owner[cell]);
			const to = rim[(i + 1) % rim.length];
			const other = cells.neighbours[cell].find(
				(n) => cells.rims[n].includes(from) && cells.rims[n].includes(to),
			);
			if (other === undefined || owner[other] <= owner[cell]) return;
			const pair = `${owner[cell]} ${owner[other]}`;
			sides.set(pair, [...(sides.get(pair) ?? []), [from, to]]);
		});
	});
	const found = [...sides]
		.filter(([, list]) => list.length === 1)
		.map(([pair, [side]]) => ({ pair: pair.split(' ').map(Number), side }))
		.filter(({ pair, side: [from, to] }) => {
			const [c, d] = [from, to].map((end) => [...around[end]].find((o) => !pair.includes(o)) ?? -1);
			return !pair.includes(-1) && c >= 0 && d >= 0 && c !== d && !graph[c].includes(d);
		})
		.sort((a, b) => toMiddle(cells, a.side) - toMiddle(cells, b.side));
	if (found.length === 0) throw new Error('No place for a four-corner point');
	return found[0].side;
}

function toMiddle(cells: Cells, [from]: [number, number]): number {
	return Math.hypot(...cells.vertices[from]);
}
