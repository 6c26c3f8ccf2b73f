import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';

/**
 * Whether the rules can be kept with so many inks, by trying everything; for a dozen regions. Reserved
 * inks are for those who are locked to them, by `opening` where those are not the locks to keep.
 */
export function feasible(
	problem: ColouringProblem,
	inks: number,
	opening: ColouringProblem['locks'] = problem.locks,
): boolean {
	const { regions, borders } = problem;
	const colouring = new Int32Array(regions).fill(-1);
	const differ: number[][] = Array.from({ length: regions }, () => []);
	const same: number[][] = Array.from({ length: regions }, () => []);
	const put = (rows: number[][], a: number, b: number) => {
		rows[Math.max(a, b)].push(Math.min(a, b));
	};
	for (let i = 0; i < borders.a.length; i++) put(differ, borders.a[i], borders.b[i]);
	for (const [a, b] of problem.apart ?? []) put(differ, a, b);
	for (const [a, b] of problem.alike ?? []) put(same, a, b);
	const kept = keptBack(problem, opening);
	const fits = (r: number, ink: number) =>
		!kept(r, ink) &&
		!((problem.locks?.[r] ?? -1) >= 0 && problem.locks?.[r] !== ink) &&
		!problem.forbidden?.some(([region, bad]) => region === r && bad === ink) &&
		differ[r].every((other) => colouring[other] !== ink) &&
		same[r].every((other) => other === r || colouring[other] === ink);
	const extend = (r: number): boolean => {
		if (r === regions) return true;
		for (let ink = 0; ink < inks; ink++) {
			if (!fits(r, ink)) continue;
			colouring[r] = ink;
			if (extend(r + 1)) return true;
		}
		return false;
	};
	return extend(0);
}

/** Whether an ink is reserved, and no region that the first is alike with by any chain is locked to it. */
function keptBack(
	{ regions, reserved, alike }: ColouringProblem,
	locks: ColouringProblem['locks'],
) {
	const group = Array.from({ length: regions }, (_, r) => r);
	for (let round = 0; round < regions; round++) {
		for (const [a, b] of alike ?? []) group[a] = group[b] = Math.min(group[a], group[b]);
	}
	return (r: number, ink: number) =>
		(reserved?.includes(ink) ?? false) &&
		!group.some((same, other) => same === group[r] && locks?.[other] === ink);
}

/** The smallest number of inks up to `most` that keeps the rules, or null. */
export function fewest(problem: ColouringProblem, most: number): number | null {
	for (let inks = problem.regions === 0 ? 0 : 1; inks <= most; inks++) {
		if (feasible(problem, inks)) return inks;
	}
	return null;
}
