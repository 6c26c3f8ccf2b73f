import type { ColouringProblem, Explanation, Proof } from './problem.ts';

/** What is known of a colouring, as far as more could be found out with more effort. */
export type Standing =
	| { status: 'coloured'; inksUsed: number; lowerBound: number; proof: Proof }
	| { status: 'impossible'; explanation: Explanation }
	| { status: 'undecided'; lowerBound: number };

/**
 * What an answer leaves open: whether fewer `inks` do, the `answer` itself, or whether a cheaper `release`
 * would do; null when nothing is. With a number of inks asked for, fewer are nobody's wish.
 */
export type OpenQuestion = 'inks' | 'answer' | 'release';

export function openQuestion(
	standing: Standing,
	inks: ColouringProblem['inks'],
): OpenQuestion | null {
	switch (standing.status) {
		case 'coloured':
			return inks === 'fewest' && standing.proof.kind === 'not-proved' ? 'inks' : null;
		case 'undecided':
			return 'answer';
		case 'impossible': {
			const { release } = standing.explanation;
			return release && !release.proved ? 'release' : null;
		}
	}
}

/** How a later answer to the same problem is better than an earlier one. */
export type Gain =
	| 'fewer-inks'
	| 'proof'
	| 'higher-bound'
	| 'answer'
	| 'cheaper-release'
	| 'release-proved'
	| 'release-bound';

/** The most welcome way in which `after` is better than `before`; null when it is not. */
export function gainOf(before: Standing, after: Standing): Gain | null {
	if (before.status === 'undecided' && after.status !== 'undecided') return 'answer';
	if (before.status === 'impossible' && after.status === 'impossible') {
		return releaseGain(before.explanation, after.explanation);
	}
	if (before.status === 'impossible' || after.status === 'impossible') return null;
	if (before.status === 'coloured' && after.status === 'coloured') {
		if (after.inksUsed !== before.inksUsed) {
			return after.inksUsed < before.inksUsed ? 'fewer-inks' : null;
		}
		const proved = (one: { proof: Proof }) => one.proof.kind !== 'not-proved';
		if (proved(after) !== proved(before)) return proved(after) ? 'proof' : null;
	}
	return after.lowerBound > before.lowerBound && after.status === before.status
		? 'higher-bound'
		: null;
}

function releaseGain({ release: one }: Explanation, { release: other }: Explanation): Gain | null {
	if (!one || !other || one.proved) return null;
	if (other.cost < one.cost) return 'cheaper-release';
	if (other.cost > one.cost) return null;
	if (other.proved) return 'release-proved';
	return other.lowerBound > one.lowerBound ? 'release-bound' : null;
}
