/** What became of one thing that people had decided, when the boundaries under it changed. */
export interface CarriedRow {
	/** what it was: a lock, a forbidden ink, a territory's base ... */
	what: string;
	/** keys of the old regions that it named */
	keys: string[];
	/** keys of the new regions that have it now; none where it was dropped */
	now: string[];
	/**
	 * `followed` it stands as before, under the new key; `copied` to each piece of a region that was split;
	 * `doubled` it said the same as another that stands, and is in that one; `dropped` it no longer stands;
	 * `settled` several disagreed and the one with more area was taken
	 */
	outcome: 'followed' | 'copied' | 'doubled' | 'dropped' | 'settled';
	/** the same in a plain sentence */
	words: string;
}
