import type { ColouringProblem } from '../problem.ts';
import { clauseProof } from './clause-proof.ts';
import { expandReserved } from './expand-reserved.ts';
import { pairsApart, partClauses, type Part } from './part-clauses.ts';
import type { Claim, ClauseEvidence, Pair, ProofFile, ShapeEvidence } from './proof-form.ts';

/** A claim that something cannot be done, as clauses that any satisfiability tool can read. */
export interface OpenProof {
	claim: Extract<Claim, { claim: 'inks do not' | 'cannot be kept' }>;
	/** the regions of the part by their number in the file; vertex i stands for the i-th */
	regions: readonly number[];
	/** pairs of places in `regions`, from 0 */
	borders: Pair[];
	/** the variable of vertex i (from 0) and the c-th of these inks (from 0) is i * inks.length + c + 1 */
	inks: readonly number[];
	clauses: number[][];
	/** a DRUP refutation; null when none was found within the effort */
	proof: string | null;
}

/** Conflicts for a clause proof of what a shape shows at sight. */
const CONFLICTS = 50_000;

/** The first claim of a file that something cannot be done; null when it has none. */
export function openProof(file: ProofFile): OpenProof | null {
	const claim = file.claims.find(
		(one) => one.claim === 'inks do not' || one.claim === 'cannot be kept',
	);
	if (!claim) return null;
	const { evidence } = claim;
	const part =
		evidence.kind === 'clauses' ? partOf(file, claim, evidence) : plainPart(file, evidence, claim);
	const borders = part.borders ?? pairsApart(part.problem, part.regions);
	const place = new Map(part.regions.map((region, i) => [region, i]));
	const proof =
		evidence.kind === 'clauses' ? evidence : clauseProof(part, { conflicts: CONFLICTS });
	return {
		claim,
		regions: part.regions,
		borders: borders.map(([a, b]): Pair => [place.get(a) as number, place.get(b) as number]),
		inks: part.inks,
		clauses: partClauses(part),
		proof: proof && proof.clauses,
	};
}

function partOf(file: ProofFile, claim: OpenProof['claim'], evidence: ClauseEvidence): Part {
	const { regions, inks, borders } = evidence;
	const problem = problemIn(file);
	const locked = 'locks' in claim ? claim.locks : file.rules.locks.map(([region]) => region);
	return { problem, regions, inks, locks: new Set(locked), ...(borders ? { borders } : {}) };
}

/** A shape by its borders alone, no rule of the map written down. */
function plainPart(
	{ regions: { length } }: ProofFile,
	{ kind, regions }: ShapeEvidence,
	{ inks }: OpenProof['claim'],
): Part {
	const few = Array.from({ length: inks as number }, (_, ink) => ink);
	const problem = { regions: length, borders: { a: [], b: [] }, inks: 'fewest' as const };
	return { problem, regions, inks: few, locks: new Set(), borders: shapeBorders(kind, regions) };
}

function shapeBorders(kind: ShapeEvidence['kind'], regions: readonly number[]): Pair[] {
	if (kind === 'one region') return [];
	if (kind === 'clique')
		return regions.flatMap((a, i) => regions.slice(0, i).map((b): Pair => [a, b]));
	const rim = kind === 'odd wheel' ? regions.slice(1) : regions;
	const ring = rim.map((a, i): Pair => [a, rim[(i + 1) % rim.length]]);
	return kind === 'odd wheel' ? [...ring, ...rim.map((a): Pair => [regions[0], a])] : ring;
}

/** The map of a file as a problem in which reserved inks are forbidden ones. */
function problemIn({ regions, borders, rules }: ProofFile): ColouringProblem {
	const locks = new Int32Array(regions.length).fill(-1);
	for (const [region, ink] of rules.locks) locks[region] = ink;
	return expandReserved({
		regions: regions.length,
		borders: { a: borders.map((pair) => pair[0]), b: borders.map((pair) => pair[1]) },
		inks: 'fewest',
		locks,
		forbidden: rules.forbidden,
		alike: rules.alike,
		apart: rules.apart,
		reserved: rules.reserved,
	});
}
