import type { SubmitFunction } from '@sveltejs/kit';

/** Makes the sender of a form; the words are shown while it is away. */
export type Send = (what: string) => SubmitFunction;
/** What was typed into a form that could not be taken, by field. */
export type Typed = Record<string, string>;
/** What is wrong with a form, by field. */
export type Errors = Record<string, string[] | undefined>;
