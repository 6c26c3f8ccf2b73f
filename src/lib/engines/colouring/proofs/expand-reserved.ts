import type { ColouringProblem } from '../problem.ts';
import { reservedByRegion } from '../reserved.ts';

/** The same problem with reserved inks told as forbidden ones, of every region they are kept from. */
export function expandReserved(problem: ColouringProblem): ColouringProblem {
	const reserved = reservedByRegion(problem);
	if (!reserved) return problem;
	const bans: [number, number][] = [];
	for (const ink of reserved.inks) {
		for (let region = 0; region < problem.regions; region++) {
			if (reserved.keptFrom(region, ink)) bans.push([region, ink]);
		}
	}
	return { ...problem, reserved: [], forbidden: [...(problem.forbidden ?? []), ...bans] };
}
