import type { SubmitFunction } from '@sveltejs/kit';

/** Makes the sender of a form; the words are shown while it is away. */
export type Send = (what: string) => SubmitFunction;

/** What whoever looks may do with a change of the boundaries. */
export interface RecutRights {
	/** begin, answer, cancel, read again, drop */
	upload: boolean;
	/** match, apply, put back */
	mend: boolean;
}

/** What is looked at in the drawings: regions on either side, and a place between them. */
export interface Looked {
	/** told apart by the tables that list it */
	id: string;
	words: string;
	before: readonly string[];
	after: readonly string[];
	at: [number, number] | null;
}
