import { count } from '../../format';
import type { HowNamed } from '$lib/engines/sheet/labels/set-name';

/** How a name is set, and why, for the table and the bar. */
export const howWords: Record<HowNamed, string> = {
	inside: 'inside',
	over: 'over its border',
	beside: 'beside',
	leader: 'by a leader',
	hand: 'by hand',
	number: 'number',
	listed: 'in the table only',
	letters: 'in the table only',
	nameless: 'no name',
	hidden: 'hidden',
	off: 'no names are set',
};

export const whyWords: Record<HowNamed, string> = {
	inside: 'It fits within its region.',
	over: 'Its region is a little narrower than the name.',
	beside: 'Its region is too small; there is empty paper next to it.',
	leader: 'Its region is too small and there is no room next to it.',
	hand: 'Somebody put it there.',
	number: 'No room for the name; the list on the sheet says whose the number is.',
	listed: 'No room: it would cover other names or borders.',
	letters: 'It has letters that the sheet’s fonts lack.',
	nameless: 'The boundary file gives it no name.',
	hidden: 'Somebody hid it.',
	off: 'Names are switched off for this sheet.',
};

/** "92 inside, 36 over its border ...", the most first. */
export function tallyWords(all: readonly HowNamed[]): string {
	const counts = new Map<string, number>();
	for (const how of all) counts.set(howWords[how], (counts.get(howWords[how]) ?? 0) + 1);
	return [...counts]
		.sort((a, b) => b[1] - a[1])
		.map(([words, many]) => `${count(many)} ${words}`)
		.join(', ');
}
