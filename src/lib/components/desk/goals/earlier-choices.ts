import { date } from '$lib/components/format';
import type { DeskEdition } from '$lib/schemas/desk';
import { earlierName, type Earlier } from '$lib/state/earlier-inks';

/** Earlier colourings as the values of a choice: "edition 3", "revision 12". */
export const earlierValue = (earlier: Earlier): string =>
	'edition' in earlier ? `edition ${earlier.edition}` : `revision ${earlier.revision}`;

export function earlierOf(value: string): Earlier | null {
	const [kind, number] = value.split(' ');
	if (kind === 'edition') return { edition: Number(number) };
	return kind === 'revision' ? { revision: Number(number) } : null;
}

/** Every edition, the newest first, and what is chosen now where it is none of them. */
export function earlierChoices(editions: readonly DeskEdition[], chosen?: Earlier | null) {
	const choices = editions.map(({ number, issuedAt }) => ({
		value: `edition ${number}`,
		label: `edition ${number}, ${date(issuedAt)}`,
	}));
	const other = chosen && !choices.some(({ value }) => value === earlierValue(chosen));
	return other
		? [...choices, { value: earlierValue(chosen), label: earlierName(chosen) }]
		: choices;
}
