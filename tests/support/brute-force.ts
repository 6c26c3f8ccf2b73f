import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';

/** Whether the rules can be kept with so many inks, by trying everything; for a dozen regions. */
export function feasible(problem: ColouringProblem, inks: number): boolean {
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
	const fits = (r: number, ink: number) =>
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

/** The smallest number of inks up to `most` that keeps the rules, or null. */
export function fewest(problem: ColouringProblem, most: number): number | null {
	for (let inks = problem.regions === 0 ? 0 : 1; inks <= most; inks++) {
		if (feasible(problem, inks)) return inks;
	}
	return null;
}
