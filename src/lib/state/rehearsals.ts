import type { ColouringProblem } from '$lib/engines/colouring/problem';

/** Where in the list of regions a lock is rehearsed: two places, as the second run is still slow. */
const shares = [1 / 3, 2 / 3];

/**
 * What a first lock will ask: the problem as it stands with one region locked to another ink in use. The
 * problem without such a lock would not do, as nothing in it has to be recoloured.
 */
export function rehearsals(problem: ColouringProblem, inks: ArrayLike<number>): ColouringProblem[] {
	const used = Array.from(inks).reduce((most, ink) => Math.max(most, ink + 1), 0);
	if (used < 2) return [];
	return shares.map((share) => {
		const region = Math.floor(share * problem.regions);
		const locks = Int32Array.from(problem.locks ?? new Int32Array(problem.regions).fill(-1));
		locks[region] = (inks[region] + 1) % used;
		return { ...problem, locks };
	});
}
