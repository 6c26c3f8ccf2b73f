import { PlainQuestion } from './explain-check-clauses.ts';
import { holdersOfReserved } from './check-reserved.ts';
import type { ColouringProblem, Explanation, Rule } from './problem.ts';

/**
 * Everything that is wrong with an explanation, in plain sentences; empty when it holds. Shares no code
 * with the maker but the solver: it asks plain clauses, region by region, written from the problem's
 * own lists. What the solver cannot tell within its steps is passed over. That no cheaper release
 * exists is not shown again; its cost and bound must agree.
 */
export async function checkExplanation(
	problem: ColouringProblem,
	explanation: Explanation,
): Promise<string[]> {
	const strangers = strangersIn(problem, explanation);
	if (strangers.length > 0) return strangers;
	const ask = new PlainQuestion(problem);
	return [
		...lockErrors(ask, explanation),
		...(explanation.locks.length === 0 ? ruleErrors(problem, explanation.rules) : []),
		...regionErrors(problem, explanation),
		...releaseErrors(problem, explanation),
		...inkErrors(problem, explanation),
	];
}

function strangersIn(problem: ColouringProblem, explanation: Explanation): string[] {
	const { locks, regions, release } = explanation;
	const isLocked = (region: number) => (problem.locks?.[region] ?? -1) >= 0;
	const errors: string[] = [];
	if (!locks.every(isLocked)) errors.push('A region is blamed that is not locked.');
	if (release && !release.locks.every(isLocked)) errors.push('A lock is released that is none.');
	for (const list of [locks, regions, release?.locks ?? []]) {
		if (new Set(list).size !== list.length) errors.push('A region is named twice.');
	}
	const known = (region: number) => region >= 0 && region < problem.regions;
	if (!regions.every((region) => Number.isInteger(region) && known(region))) {
		errors.push('A region is named that does not exist.');
	}
	return errors;
}

function lockErrors(ask: PlainQuestion, { locks }: Explanation): string[] {
	const errors: string[] = [];
	if (ask.feasible(locks) === true) errors.push('The locks named do not collide.');
	for (const lock of locks) {
		const others = locks.filter((other) => other !== lock);
		if (ask.feasible(others) === false) errors.push(`The lock of region ${lock} can be spared.`);
	}
	return errors;
}

function ruleErrors(problem: ColouringProblem, rules: Rule[]): string[] {
	const kept = (some: Rule[]) => new PlainQuestion(onlyRules(problem, some)).feasible([]);
	const errors: string[] = [];
	if (kept(rules) === true) errors.push('The rules named can be kept.');
	rules.forEach((rule, i) => {
		const others = rules.filter((_, j) => j !== i);
		if (kept(others) === false) errors.push(`The rule '${rule.kind}' at place ${i} can be spared.`);
	});
	return errors;
}

/** The problem with no rules but some, which must be its own. */
function onlyRules(problem: ColouringProblem, rules: Rule[]): ColouringProblem {
	const pairs = (kind: string) =>
		rules.flatMap((rule): [number, number][] =>
			rule.kind === kind && 'a' in rule ? [[rule.a, rule.b]] : [],
		);
	const listed = (list: readonly (readonly [number, number])[] | undefined, a: number, b: number) =>
		list?.some(([p, q]) => (p === a && q === b) || (p === b && q === a)) ?? false;
	const borders = Array.from(problem.borders.a, (a, i) => [a, problem.borders.b[i]] as const);
	const own = (given: typeof problem.apart, some: [number, number][]) =>
		some.filter(([a, b]) => listed(given, a, b));
	const joined = own(borders, pairs('border'));
	const forbidden = rules.flatMap((rule): [number, number][] =>
		rule.kind === 'forbidden' ? [[rule.region, rule.ink]] : [],
	);
	return {
		regions: problem.regions,
		borders: { a: joined.map((pair) => pair[0]), b: joined.map((pair) => pair[1]) },
		inks: rules.some((rule) => rule.kind === 'inks') ? problem.inks : 'fewest',
		alike: own(problem.alike, pairs('alike')),
		apart: own(problem.apart, pairs('apart')),
		forbidden: [
			...forbidden.filter(([region, ink]) =>
				problem.forbidden?.some((pair) => pair[0] === region && pair[1] === ink),
			),
			...reservedFrom(problem, rules),
		],
	};
}

/** What the rules named say of reserved inks, as far as it is so. */
function reservedFrom(problem: ColouringProblem, rules: Rule[]): [number, number][] {
	const holders = holdersOfReserved(problem);
	return rules.flatMap((rule): [number, number][] =>
		rule.kind === 'reserved' && holders.get(rule.ink)?.has(rule.region) === false
			? [[rule.region, rule.ink]]
			: [],
	);
}

function regionErrors(problem: ColouringProblem, { locks, regions }: Explanation): string[] {
	const shown = new Set(regions);
	if (!locks.every((lock) => shown.has(lock))) return ['A region blamed is not among those shown.'];
	const inside = (pair: readonly [number, number]) => shown.has(pair[0]) && shown.has(pair[1]);
	const borders = Array.from(problem.borders.a, (a, i) => [a, problem.borders.b[i]] as const);
	const within = borders.filter(inside);
	const part = new PlainQuestion(
		{
			...problem,
			borders: { a: within.map((pair) => pair[0]), b: within.map((pair) => pair[1]) },
			alike: problem.alike?.filter(inside),
			apart: problem.apart?.filter(inside),
			forbidden: problem.forbidden?.filter(([region]) => shown.has(region)),
		},
		(region) => shown.has(region),
	);
	return part.feasible(locks) === true ? ['The regions shown do not carry the collision.'] : [];
}

function releaseErrors(
	problem: ColouringProblem,
	{ release, locks: blamed }: Explanation,
): string[] {
	if (!release) return blamed.length === 0 ? [] : ['Locks are to blame, but no release is given.'];
	if (blamed.length === 0) return ['A release is given, but the rules alone fail.'];
	const errors: string[] = [];
	const dropped = new Set(release.locks);
	const held: number[] = [];
	problem.locks?.forEach((ink, r) => {
		if (ink >= 0 && !dropped.has(r)) held.push(r);
	});
	const locks = problem.locks?.map((ink, r) => (dropped.has(r) ? -1 : ink));
	const rest = new PlainQuestion({ ...problem, locks });
	if (rest.feasible(held) === false) errors.push('The release does not help.');
	const cost = release.locks.reduce((sum, lock) => sum + (problem.lockCosts?.[lock] ?? 1), 0);
	const slack = 1e-6 * Math.max(1, cost);
	if (Math.abs(cost - release.cost) > slack) errors.push(`The release costs ${cost}.`);
	if (release.lowerBound > cost + slack) errors.push('The release costs less than its bound.');
	if (release.proved && release.lowerBound < cost - slack) errors.push('The bound proves nothing.');
	return errors;
}

function inkErrors(problem: ColouringProblem, { inksThatWouldDo }: Explanation): string[] {
	const all: number[] = [];
	problem.locks?.forEach((ink, r) => {
		if (ink >= 0) all.push(r);
	});
	const feasible = (inks: number | 'fewest') =>
		new PlainQuestion({ ...problem, inks }).feasible(all);
	if (inksThatWouldDo === null) {
		return feasible('fewest') === true ? ['Some number of inks would do.'] : [];
	}
	if (problem.inks === 'fewest' || inksThatWouldDo <= problem.inks)
		return ['That is no more inks.'];
	const errors: string[] = [];
	if (feasible(inksThatWouldDo) === false) errors.push(`${inksThatWouldDo} inks would not do.`);
	const fewer = inksThatWouldDo - 1;
	if (fewer > problem.inks && feasible(fewer) === true) errors.push(`${fewer} inks would do.`);
	return errors;
}
