import type { JoinInput } from './measure-join.ts';
import type { Joined, TakenColumn } from './measure-outcome.ts';

/** What the engine's checkers find wrong with a join and the columns taken from it, in words. */
export function faultsInTaking(
	_joined: Joined,
	_input: JoinInput,
	_taken: TakenColumn[],
): string[] {
	return [];
}
