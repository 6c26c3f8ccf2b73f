import { alikeGroups } from '../alike-groups.ts';
import type { ColouringProblem } from '../problem.ts';

/**
 * The same problem with reserved inks told as forbidden ones: of every region that neither is locked to
 * the ink nor is kept alike with one that is.
 */
export function expandReserved(problem: ColouringProblem): ColouringProblem {
	const { regions, alike, locks, reserved = [], forbidden = [] } = problem;
	if (reserved.length === 0) return problem;
	const group = alikeGroups(regions, alike);
	const groupOf = (region: number) => (group ? group[region] : region);
	const bans: [number, number][] = [];
	for (const ink of new Set(reserved)) {
		const holders = new Set<number>();
		locks?.forEach((lock, region) => lock === ink && holders.add(groupOf(region)));
		for (let region = 0; region < regions; region++) {
			if (!holders.has(groupOf(region))) bans.push([region, ink]);
		}
	}
	return { ...problem, reserved: [], forbidden: [...forbidden, ...bans] };
}
