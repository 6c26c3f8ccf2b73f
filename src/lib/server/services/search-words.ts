import type { ColouringResult, Gain } from '../../engines/colouring/index.ts';

const inksInWords = (count: number) => (count === 1 ? '1 ink' : `${count} inks`);
const figure = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });

/** What a longer search has found, in a sentence. */
export function foundSentence(gain: Gain, result: ColouringResult): string {
	if (result.status === 'coloured') return colouredSentence(gain, result);
	if (result.status === 'undecided') {
		return `At least ${inksInWords(result.lowerBound)} are needed; the rest is still open.`;
	}
	const { release } = result.explanation;
	if (gain === 'answer') return 'No colouring keeps every rule; the reason is known now.';
	const cost = figure.format(release?.cost ?? 0);
	const proved = release?.proved ? ' No cheaper release is enough.' : '';
	return gain === 'cheaper-release'
		? `Releasing locks that cost ${cost} in all is enough.${proved}`
		: gain === 'release-proved'
			? `No release of locks cheaper than ${cost} is enough: that is proved now.`
			: `Any release costs at least ${figure.format(release?.lowerBound ?? 0)}.`;
}

function colouredSentence(
	gain: Gain,
	{ inksUsed, lowerBound, proof }: Extract<ColouringResult, { status: 'coloured' }>,
): string {
	const used = inksInWords(inksUsed);
	if (gain === 'answer') return `A colouring with ${used} was found.`;
	if (gain === 'proof') return `No fewer than ${used} do: that is proved now.`;
	const least = `at least ${inksInWords(lowerBound)} are needed`;
	if (gain === 'higher-bound') return `It is known now that ${least}.`;
	const proved =
		proof.kind === 'not-proved' ? ` Of fewer it is known that ${least}.` : ' No fewer do.';
	return `A colouring with ${used} was found.${proved}`;
}

/** What is told when a search ends with nothing better. */
export const nothingSentence =
	'No better answer was found. What was known before is all that is known.';

/** What was found is about rules that have changed since. */
export const keptSentence = (found: string, revision: number): string =>
	`For revision ${revision}: ${found} The rules have changed since, so the sheet stays as it is.`;
