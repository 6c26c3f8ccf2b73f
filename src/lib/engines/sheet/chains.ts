import type { SheetArcs } from './plane/quantise.ts';

/**
 * Arcs joined end to end into lines as long as can be, so that dashes run on through the places where
 * borders meet. At a place where more than two arcs end, those that go on straightest are joined.
 *
 * In: arcs by number. Out: lines of signed arcs (i forward, ~i backward); every arc given is in one of them,
 * once. A closed line ends where it begins.
 */
export function chainsOf(arcs: SheetArcs, list: Uint32Array): Int32Array[] {
	const next = joints(arcs, list);
	const used = new Set<number>();
	const chains: Int32Array[] = [];
	const follow = (start: number) => {
		const chain: number[] = [];
		for (let at: number | undefined = start; at !== undefined && !used.has(arcOf(at));) {
			used.add(arcOf(at));
			chain.push(at);
			at = next.get(at);
		}
		if (chain.length) chains.push(Int32Array.from(chain));
	};
	// open lines from their ends first, then what is left are rings
	for (const arc of list) for (const way of [arc, ~arc]) if (!next.has(~way)) follow(way);
	for (const arc of list) follow(arc);
	return chains;
}

const arcOf = (signed: number): number => (signed < 0 ? ~signed : signed);

/** Signed arc to the signed arc that goes on from its end. */
function joints(arcs: SheetArcs, list: Uint32Array): Map<number, number> {
	const next = new Map<number, number>();
	for (const ways of waysOutOf(arcs, list).values()) {
		const free = new Set(ways);
		for (const [one, two] of straightest(arcs, ways)) {
			if (!free.has(one) || !free.has(two)) continue;
			free.delete(one);
			free.delete(two);
			next.set(~one, two);
			next.set(~two, one);
		}
	}
	return next;
}

/** The signed arcs that start at each place where arcs end. */
function waysOutOf({ arcPoints, arcStarts }: SheetArcs, list: Uint32Array): Map<string, number[]> {
	const places = new Map<string, number[]>();
	for (const arc of list) {
		for (const way of [arc, ~arc]) {
			const point = way < 0 ? arcStarts[arc + 1] - 1 : arcStarts[arc];
			const place = `${arcPoints[2 * point]} ${arcPoints[2 * point + 1]}`;
			const ways = places.get(place);
			if (ways) ways.push(way);
			else places.set(place, [way]);
		}
	}
	return places;
}

/** Pairs of ways out of one place, the straightest first; an arc that begins and ends there is no pair. */
function straightest(arcs: SheetArcs, ways: number[]): [number, number][] {
	const headings = ways.map((way) => headingOf(arcs, way));
	const pairs: { pair: [number, number]; bend: number }[] = [];
	for (let i = 0; i < ways.length; i++) {
		for (let j = i + 1; j < ways.length; j++) {
			if (arcOf(ways[i]) === arcOf(ways[j])) continue;
			const turn = Math.abs(headings[i] - headings[j]);
			const bend = Math.abs(Math.PI - Math.min(turn, 2 * Math.PI - turn));
			pairs.push({ pair: [ways[i], ways[j]], bend });
		}
	}
	return pairs.sort((a, b) => a.bend - b.bend).map(({ pair }) => pair);
}

function headingOf({ arcPoints, arcStarts }: SheetArcs, way: number): number {
	const arc = arcOf(way);
	const from = way < 0 ? arcStarts[arc + 1] - 1 : arcStarts[arc];
	const to = way < 0 ? from - 1 : from + 1;
	return Math.atan2(
		arcPoints[2 * to + 1] - arcPoints[2 * from + 1],
		arcPoints[2 * to] - arcPoints[2 * from],
	);
}
