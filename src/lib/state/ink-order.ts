import type { DeskColouring } from '$lib/schemas/desk';
import type { Desk } from './desk.svelte';
import { swapInks, swapOf } from './ink-edits';

/**
 * Two inks of the palette change places and every region keeps its colour: locks, rules and the colouring go
 * with their ink. False, and nothing done, where the answer would no longer hold: when an ink in use would
 * come to stand behind one that is not, or a proof speaks of inks by number. Then the engine must be asked.
 */
export function moveInk(
	{ draft, colouring }: Pick<Desk, 'draft' | 'colouring'>,
	one: number,
	two: number,
): boolean {
	const { answer } = colouring;
	if (answer?.status !== 'coloured') return false;
	const inUse = (ink: number) => ink < answer.inksUsed;
	if (inUse(one) !== inUse(two) || answer.proof.kind === 'refutation') return false;
	const to = swapOf(one, two);
	const document = swapInks(one, two)(draft.document);
	const inks = colouring.inks.map(to);
	const moved: DeskColouring = { ...answer, inks: [...inks] };
	colouring.know(document, moved, inks);
	draft.change(`move ink ${one + 1}`, () => document);
	return true;
}
