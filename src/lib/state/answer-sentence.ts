import { explanationSentence, proofSentence } from '$lib/engines/colouring';
import type { ColouringResult } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { DeskSheet } from '$lib/schemas/desk';

/** What the colouring engine found, in the engine's own words, with the names of regions and inks. */
export function answerSentence(
	result: ColouringResult,
	{ regions }: Pick<DeskSheet, 'regions'>,
	{ palette }: Pick<Draft, 'palette'>,
): string {
	const nameOf = (region: number) => regions.name[region];
	const inkName = (ink: number) => palette.inks[ink]?.name || `ink ${ink + 1}`;
	if (result.status === 'undecided') return result.message;
	if (result.status === 'impossible')
		return explanationSentence(result.explanation, nameOf, inkName);
	return proofSentence(result, nameOf);
}
