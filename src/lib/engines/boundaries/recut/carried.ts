import { listedKeys, quoted } from './words.ts';

/** What became of one thing that people had decided, when the boundaries under it changed. */
export interface CarriedRow {
	/** what it was: 'lock', 'forbidden', 'alike', 'apart', 'struck', 'added', 'base' ... */
	what: string;
	/** keys of the old regions that it named */
	keys: string[];
	/** keys of the new regions that have it now; none where it was dropped */
	now: string[];
	/**
	 * `followed` it stands, under the new key; `copied` to several pieces of a region that was split;
	 * `doubled` it says the same as another that stands, and is in that one; `settled` several
	 * disagreed and the one with more area was taken; `dropped` it no longer stands
	 */
	outcome: 'followed' | 'copied' | 'doubled' | 'settled' | 'dropped';
	/** the same in a plain sentence */
	words: string;
}

/** What a row is made of. */
export interface Carrying {
	what: string;
	keys: string[];
	/** start of the sentence: `The lock of "A" on Red` */
	subject: string;
}

/**
 * A row of the report in words. `now` are the new regions by key; with a `reason` (a clause without full
 * stop) it was dropped, or is not on all that might have had it.
 */
export function carriedRow(
	{ what, keys, subject }: Carrying,
	outcome: CarriedRow['outcome'],
	now: string[],
	reason = '',
): CarriedRow {
	const there = listedKeys(now.map(quoted));
	const isSame = now.length === keys.length && now.every((key, i) => key === keys[i]);
	const because = reason ? `: ${reason}` : '';
	const said = {
		followed: isSame ? 'stands' : `follows to ${there}`,
		copied: `is copied to ${there}`,
		doubled: 'says what another says too, and is in that one',
		settled: `is settled for ${there}`,
		dropped: 'is dropped',
	};
	return { what, keys, now, outcome, words: `${subject} ${said[outcome]}${because}.` };
}
