import type { ColouringProblem } from './problem.ts';

/**
 * For checkers: which regions may have each reserved ink, found by walking from the regions locked to it
 * along the pairs that are kept alike. Shares no code with the colourer.
 */
export function holdersOfReserved(problem: ColouringProblem): Map<number, Set<number>> {
	const alikeWith = new Map<number, number[]>();
	const join = (a: number, b: number) => {
		const list = alikeWith.get(a);
		if (list) list.push(b);
		else alikeWith.set(a, [b]);
	};
	const holders = new Map<number, Set<number>>();
	for (const ink of problem.reserved ?? []) holders.set(ink, new Set());
	if (holders.size === 0) return holders;
	for (const [a, b] of problem.alike ?? []) {
		join(a, b);
		join(b, a);
	}
	problem.locks?.forEach((ink, region) => holders.get(ink)?.add(region));
	for (const held of holders.values()) {
		// A set hands out what is added while it is walked.
		for (const region of held) for (const other of alikeWith.get(region) ?? []) held.add(other);
	}
	return holders;
}
