import { checkDrup } from '../../../solver/drup.ts';
import type { ClauseEvidence, Pair } from '../proof-form.ts';
import { limits } from './limits.ts';
import type { MapRules } from './map-rules.ts';
import { pairsWithin } from './pairs-within.ts';

export type Shown = { shown: true } | { shown: false; fault: string; gaveUp?: boolean };

const fault = (words: string): Shown => ({ shown: false, fault: words });
const gaveUp = (words: string): Shown => ({ shown: false, fault: words, gaveUp: true });

/**
 * Whether the clauses refute every colouring of the regions named with at most `most` inks, written down
 * afresh from the map and rules of the file. `locked`: the regions whose locks are leant on.
 */
export function clausesRefute(
	rules: MapRules,
	evidence: ClauseEvidence,
	{ most, locked, steps }: { most: number; locked: ReadonlySet<number>; steps: number },
): Shown {
	const { regions, inks } = evidence;
	const pairs = neededPairs(rules, evidence);
	if (!pairs) return fault('it leans on a border that is not there.');
	const bans = bansWithin(rules, regions, locked);
	if (!enoughInks(bans, evidence, most)) return fault('it leaves out inks that would be allowed.');
	if (regions.length * inks.length > limits.variables) return gaveUp('the part is too large.');
	const alike = rules.file.rules.alike;
	if ((pairs.length + 2 * alike.length + bans.length + 1) * inks.length > limits.clauses) {
		return gaveUp('the part has too many borders and rules.');
	}
	const clauses = written(evidence, pairs, alike, bans);
	const variables = regions.length * inks.length;
	const { literals } = limits;
	const told = checkDrup(clauses, evidence.clauses, { variables, steps, literals });
	if (told.valid) return { shown: true };
	return { shown: false, fault: `${told.reason}.`, gaveUp: told.gaveUp };
}

/** The pairs among the regions that are written down; null when one is named that need not differ. */
function neededPairs({ file }: MapRules, { regions, borders }: ClauseEvidence): Pair[] | null {
	const touching = pairsWithin(file, regions);
	if (!borders) return touching.pairs();
	return borders.every(([a, b]) => touching.has(a, b)) ? [...borders] : null;
}

/** A region that has one ink, or has not: `ink` with `only` or without. */
interface Ban {
	region: number;
	ink: number;
	only: boolean;
}

function bansWithin(rules: MapRules, regions: readonly number[], locked: ReadonlySet<number>) {
	const inside = new Set(regions);
	const bans: Ban[] = [];
	for (const [region, ink] of rules.file.rules.forbidden) {
		if (inside.has(region)) bans.push({ region, ink, only: false });
	}
	for (const ink of new Set(rules.file.rules.reserved)) {
		for (const region of regions) {
			if (rules.barred(region, ink)) bans.push({ region, ink, only: false });
		}
	}
	for (const region of regions) {
		const ink = locked.has(region) ? rules.lock.get(region) : undefined;
		if (ink !== undefined) bans.push({ region, ink, only: true });
	}
	return bans;
}

/**
 * Inks that no rule names here are alike: if there is a colouring, there is one in which at most as many
 * of them as there are regions occur, and it does not matter which.
 */
function enoughInks(bans: readonly Ban[], { inks, regions }: ClauseEvidence, most: number) {
	if (inks.some((ink) => ink >= most)) return false;
	const written = new Set(inks);
	const named = new Set(bans.map(({ ink }) => ink).filter((ink) => ink < most));
	for (const ink of named) if (!written.has(ink)) return false;
	return inks.length - named.size >= Math.min(most - named.size, regions.length);
}

function written(
	{ regions, inks }: ClauseEvidence,
	pairs: readonly Pair[],
	alike: readonly Pair[],
	bans: readonly Ban[],
): number[][] {
	const first = new Map(regions.map((region, i) => [region, i * inks.length + 1]));
	const offset = new Map(inks.map((ink, c) => [ink, c]));
	const clauses = regions.map((_, i) => inks.map((_, c) => i * inks.length + c + 1));
	const ends = ([a, b]: Pair) => [first.get(a), first.get(b)] as const;
	for (const pair of pairs) {
		const [x, y] = ends(pair);
		if (x !== undefined && y !== undefined) inks.forEach((_, c) => clauses.push([-x - c, -y - c]));
	}
	for (const pair of alike) {
		const [x, y] = ends(pair);
		if (x === undefined || y === undefined) continue;
		inks.forEach((_, c) => clauses.push([-x - c, y + c], [x + c, -y - c]));
	}
	for (const { region, ink, only } of bans) {
		const x = first.get(region) as number;
		const c = offset.get(ink);
		if (!only && c !== undefined) clauses.push([-x - c]);
		if (only) inks.forEach((other, k) => other !== ink && clauses.push([-x - k]));
	}
	return clauses;
}
