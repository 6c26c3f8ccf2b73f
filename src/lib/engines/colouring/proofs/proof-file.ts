import { colour } from '../colour.ts';
import type { ColouringProblem, ColouringResult, Explanation, Proof } from '../problem.ts';
import { collisionProof } from './collision-proof.ts';
import { pairsApart } from './part-clauses.ts';
import type { Claim, Evidence, Pair, ProofFile, ShapeEvidence } from './proof-form.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/** How regions are called in a file: by key, and by name where there is one. */
export type RegionNames = readonly { key: string; name?: string }[];

/**
 * The proof file of a result: the whole map with its rules, what is claimed of it and what shows it.
 * For a colouring that is the colouring and, where it is proved, why no fewer inks do; for rules that
 * cannot be kept, the collision as clauses, and colourings that show that dropping the locks of the
 * release works and that more inks would do. Null when nothing is claimed: a result that is undecided,
 * or a collision that could not be shown in clauses.
 *
 * In: a problem without faults and its result; one name for each region. The same input gives the same
 * file. That a release is the cheapest, and that no lock could be spared, is not claimed.
 */
export async function proofFile(
	problem: ColouringProblem,
	result: ColouringResult,
	names: RegionNames,
): Promise<ProofFile | null> {
	const claims = await claimsOf(problem, result);
	if (claims.length === 0) return null;
	return {
		form: 'merestone proof 1',
		regions: names.map(({ key, name }) => (name === undefined ? { key } : { key, name })),
		borders: pairsOnce(problem.borders),
		rules: {
			locks: locksOf(problem),
			forbidden: pairList(problem.forbidden),
			alike: pairList(problem.alike),
			apart: pairList(problem.apart),
			reserved: [...new Set(problem.reserved)].sort((a, b) => a - b),
		},
		claims,
	};
}

/** The file as text, a section a line; the same bytes for the same file. */
export function proofText(file: ProofFile): string {
	const sections = Object.entries(file).map(([name, value]) => {
		const text = JSON.stringify(value);
		return `${JSON.stringify(name)}: ${text}`;
	});
	return `{\n${sections.join(',\n')}\n}\n`;
}

async function claimsOf(problem: ColouringProblem, result: ColouringResult): Promise<Claim[]> {
	if (result.status === 'coloured') return colouringClaims(problem, result);
	if (result.status === 'undecided') return [];
	const { explanation } = result;
	const collision = collisionProof(problem, explanation);
	return collision
		? [
				collision,
				...(await releaseClaim(problem, explanation)),
				...(await moreInks(problem, explanation)),
			]
		: [];
}

function colouringClaims(problem: ColouringProblem, result: Coloured): Claim[] {
	const { inksUsed, colouring, proof } = result;
	const evidence = evidenceOf(problem, proof, inksUsed);
	return [
		{ claim: 'inks do', inks: inksUsed, colouring: Array.from(colouring) },
		...(evidence ? [{ claim: 'inks do not' as const, inks: inksUsed - 1, evidence }] : []),
	];
}

const shapes: Partial<Record<Proof['kind'], ShapeEvidence['kind']>> = {
	edge: 'clique',
	clique: 'clique',
	'odd-cycle': 'odd ring',
	'odd-wheel': 'odd wheel',
};

function evidenceOf(problem: ColouringProblem, proof: Proof, inks: number): Evidence | null {
	const { kind, regions, refutation } = proof;
	if (kind === 'none-needed') return inks === 1 ? { kind: 'one region', regions: [0] } : null;
	const shape = shapes[kind];
	if (shape) return { kind: shape, regions: [...regions] };
	if (kind === 'not-proved' || !refutation) return null;
	return {
		kind: 'clauses',
		regions: [...regions],
		inks: Array.from({ length: refutation.inks }, (_, ink) => ink),
		borders: proof.borders ? [...proof.borders] : pairsApart(problem, regions),
		format: 'drup',
		clauses: refutation.clauses,
	};
}

/** A colouring without the locks of the release; none when it is not found within the problem's effort. */
async function releaseClaim(problem: ColouringProblem, { release }: Explanation): Promise<Claim[]> {
	if (!release || !problem.locks) return [];
	const locks = problem.locks.slice();
	for (const region of release.locks) locks[region] = -1;
	const found = await colour({ ...problem, locks, goal: 'any' });
	if (found.status !== 'coloured') return [];
	const inks = problem.inks === 'fewest' ? found.inksUsed : problem.inks;
	const colouring = Array.from(found.colouring);
	return [{ claim: 'works without', inks, locks: [...release.locks], colouring }];
}

async function moreInks(
	problem: ColouringProblem,
	{ inksThatWouldDo: inks }: Explanation,
): Promise<Claim[]> {
	if (inks === null) return [];
	const found = await colour({ ...problem, inks, goal: 'any' });
	if (found.status !== 'coloured') return [];
	return [{ claim: 'inks do', inks, colouring: Array.from(found.colouring) }];
}

function locksOf({ locks }: ColouringProblem): Pair[] {
	const pairs: Pair[] = [];
	locks?.forEach((ink, region) => {
		if (ink >= 0) pairs.push([region, ink]);
	});
	return pairs;
}

const pairList = (pairs: readonly Pair[] = []): Pair[] => pairs.map(([a, b]) => [a, b]);

/** Each border once, smaller number first, in order. */
function pairsOnce({ a, b }: ColouringProblem['borders']): Pair[] {
	const pairs = Array.from(a, (p, i): Pair => [Math.min(p, b[i]), Math.max(p, b[i])]);
	pairs.sort((p, q) => p[0] - q[0] || p[1] - q[1]);
	return pairs.filter((p, i) => i === 0 || p[0] !== pairs[i - 1][0] || p[1] !== pairs[i - 1][1]);
}
