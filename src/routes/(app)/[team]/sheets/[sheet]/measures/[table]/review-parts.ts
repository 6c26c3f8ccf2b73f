import type { SubmitFunction } from '@sveltejs/kit';

/** Makes the sender of a form; the words are shown while it is away. */
export type Send = (what: string) => SubmitFunction;
/** What is wrong with a form, by field. */
export type Errors = Record<string, string[] | undefined>;
