import { handOut } from './hand-out.ts';
import { linkPath } from './link-path.ts';
import { partsOf } from './parts-of.ts';
import type { SearchTerms } from './search-terms.ts';
import { seedEmpty } from './seed-empty.ts';

/** Rounds of linking and handing out before the compulsory phase gives up. */
const ROUNDS = 12;

/**
 * The compulsory phase: an assignment as near to today as can be seen at once that keeps every rule but
 * tolerance and `apart`. Leavers' units, units without a territory and torn-off parts are handed to
 * bordering territories, the emptiest first; a part that must stay, or is cheaper to link than to give
 * away, is linked over the cheapest path.
 *
 * @returns null when no such assignment was found (which does not prove that there is none)
 */
export function startingAssignment(terms: SearchTerms): Int32Array | null {
	const { prepared } = terms;
	const assignment = wished(terms);
	seedEmpty(terms, assignment);
	/** units laid down as links: nothing gives them away again */
	const links = new Uint8Array(prepared.units);
	for (let round = 0; round < ROUNDS; round++) {
		const torn = looseParts(terms, assignment, links);
		for (const part of torn) mend(terms, assignment, links, part);
		handOut(terms, assignment);
		const left = assignment.findIndex((t) => t < 0);
		if (left < 0 && looseParts(terms, assignment, links).length === 0) return assignment;
		if (left >= 0 && !linkPath(terms, assignment, links, [left], -1)) return null;
	}
	return null;
}

/** Where the rules on units put each block; else where most of its cost is today; else nowhere. */
function wished({ prepared, row, may }: SearchTerms): Int32Array {
	const { problem, fixed, territories, cost } = prepared;
	const assignment = new Int32Array(prepared.units).fill(-1);
	for (const block of prepared.blocks) {
		let best = -1;
		let bestKept = -1;
		const mayBe = (t: number) => block.every((unit) => may[row[unit] * territories + t]);
		for (const unit of block) {
			const t = fixed[unit] >= 0 ? fixed[unit] : problem.today[unit];
			const isFixed = fixed[unit] >= 0;
			if (t < 0 || (!isFixed && !mayBe(t))) continue;
			const kept = block.reduce((sum, u) => sum + (problem.today[u] === t ? cost[u] : 0), 0);
			if (!isFixed && kept <= bestKept) continue;
			best = t;
			bestKept = isFixed ? Infinity : kept;
		}
		for (const unit of block) assignment[unit] = best;
	}
	return assignment;
}

interface Part {
	territory: number;
	units: number[];
}

/** Parts of territories other than the rooted one: the base's, else the one that must stay, else the largest. */
function looseParts(terms: SearchTerms, assignment: Int32Array, links: Uint8Array): Part[] {
	const { prepared } = terms;
	const { problem, open, fixed } = prepared;
	const { territory, units } = partsOf(prepared.graph, assignment);
	const parts: number[][] = Array.from({ length: prepared.territories }, () => []);
	territory.forEach((t, part) => t >= 0 && parts[t].push(part));
	const loose: Part[] = [];
	parts.forEach((list, t) => {
		if (list.length < 2 || !open[t]) return;
		const { base } = problem.territories[t];
		const weight = (part: number) =>
			(units[part].includes(base) ? 4e9 : 0) +
			(units[part].some((unit) => fixed[unit] >= 0 || links[unit]) ? 2e9 : 0) +
			units[part].length;
		const rooted = list.reduce((a, b) => (weight(b) > weight(a) ? b : a));
		for (const part of list) if (part !== rooted) loose.push({ territory: t, units: units[part] });
	});
	return loose;
}

function mend(terms: SearchTerms, assignment: Int32Array, links: Uint8Array, part: Part): void {
	const { prepared, grouped } = terms;
	const mustStay = part.units.some(
		(unit) => prepared.fixed[unit] >= 0 || links[unit] || grouped[unit],
	);
	const worth = part.units.reduce((sum, unit) => sum + prepared.cost[unit], 0);
	const most = mustStay ? Infinity : worth;
	if (linkPath(terms, assignment, links, part.units, part.territory, most)) return;
	for (const unit of part.units) {
		const free = terms.movable[unit] && !links[unit];
		if (free) for (const u of prepared.blocks[prepared.block[unit]]) assignment[u] = -1;
	}
}
