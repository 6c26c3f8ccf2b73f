import { checkColouring } from './check-colouring.ts';
import type { ColouringProblem } from './problem.ts';

/**
 * Everything that is wrong with a colouring that is to keep unsafe inks apart, in plain sentences; empty
 * when it holds. Reads the question's own lists and asks `checkColouring`; shares no code with the search.
 */
export function checkParting(
	{
		problem,
		unsafe,
		inks,
	}: {
		problem: ColouringProblem;
		unsafe: readonly (readonly [number, number])[];
		inks: number;
	},
	colouring: Int32Array,
): string[] {
	const inksUsed = colouring.reduce((most, ink) => Math.max(most, ink + 1), 0);
	const faults = checkColouring(problem, {
		...{ status: 'coloured', colouring, inksUsed, lowerBound: 0 },
		proof: { kind: 'not-proved', regions: [] },
	});
	if (inksUsed > inks)
		faults.push(`Ink ${inksUsed - 1} is used, but the palette has ${inks} inks.`);
	const { a, b } = problem.borders;
	for (let i = 0; i < a.length; i++) {
		const [one, two] = [colouring[a[i]], colouring[b[i]]];
		const touch = unsafe.find(([p, q]) => (p === one && q === two) || (p === two && q === one));
		if (touch) faults.push(`Inks ${touch.join(' and ')} touch on border ${i}.`);
	}
	return faults;
}
