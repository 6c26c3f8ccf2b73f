import type { ColouringResult } from '$lib/engines/colouring/problem';
import type { DeskSheet } from '$lib/schemas/desk';

/** What the colouring engine found, in one sentence with the regions' names. */
export function answerSentence(result: ColouringResult, _sheet: DeskSheet): string {
	if (result.status === 'undecided') return result.message;
	if (result.status === 'impossible') return 'These locks cannot all be kept.';
	return `${result.inksUsed} inks do.`;
}
