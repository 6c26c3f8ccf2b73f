import { count, counted } from '$lib/components/format';
import { openQuestion } from '$lib/engines/colouring/open-question';
import type { DeskColouring } from '$lib/schemas/desk';
import { searchTimes, stepsOfThorough } from '$lib/schemas/search';

/** What a colouring leaves open and how long one may try, in words. */

/** What is not known, in plain words; null when nothing is open. */
export function openWords(answer: DeskColouring, inks: number | 'fewest'): string | null {
	const question = openQuestion(answer, inks);
	if (!question) return null;
	if (answer.status === 'coloured') return inksOpen(answer.inksUsed, answer.lowerBound);
	if (answer.status === 'undecided') {
		const asked = inks === 'fewest' ? '' : ` with ${counted(inks, 'ink')}`;
		return `Whether the sheet can be coloured${asked} under these rules is not known.`;
	}
	const release = answer.explanation.release;
	if (!release) return null;
	const least =
		release.lowerBound > 0 ? ` Any release costs at least ${count(release.lowerBound)}.` : '';
	return `The release of locks found costs ${count(release.cost)}; whether a cheaper one is enough is not known.${least}`;
}

function inksOpen(used: number, atLeast: number): string {
	if (atLeast >= used) return `${counted(used, 'ink')} do. That no fewer do is not proved.`;
	const known = `At least ${counted(atLeast, 'ink')} ${atLeast === 1 ? 'is' : 'are'} needed; ${used} do.`;
	const open = used - 1 === atLeast ? `Whether ${atLeast} do` : `Whether fewer than ${used} do`;
	return `${known} ${open} is not known.`;
}

/** The choices of how long, with an estimate from what the first try took, where that is known. */
export const searchChoices = (took: number | null): { value: string; label: string }[] =>
	searchTimes.map((times) => {
		const factor = times * stepsOfThorough;
		const most = took === null ? '' : `: up to ${duration(took * factor)}`;
		return { value: String(times), label: `${count(factor)} times as long${most}` };
	});

/** Milliseconds in words, rounded as an estimate is. */
export function duration(milliseconds: number): string {
	const seconds = Math.max(1, Math.round(milliseconds / 1000));
	if (seconds < 90) return counted(seconds, 'second');
	const minutes = Math.round(seconds / 60);
	return minutes < 90 ? counted(minutes, 'minute') : counted(Math.round(minutes / 60), 'hour');
}
