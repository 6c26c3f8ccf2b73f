import { z } from 'zod';

/** What people type about themselves and each other, as forms and services accept it. */

/** Kept in small letters: the same mailbox is the same person. */
export const email = z
	.string()
	.trim()
	.toLowerCase()
	.max(254)
	.pipe(z.email('Give an e-mail address, like name@company.example.'));

export const PASSWORD_LENGTH = 12;

export const newPassword = z
	.string()
	.min(PASSWORD_LENGTH, `Use at least ${PASSWORD_LENGTH} characters.`)
	.max(200, 'Use at most 200 characters.');

/** What is typed at sign-in: any length that a form can hold, because the rule may have been another one. */
export const typedPassword = z.string().min(1, 'Give your password.').max(1000);

export const personName = z.string().trim().min(1, 'Give your name.').max(120);

export const teamName = z
	.string()
	.trim()
	.min(1, 'Give the team a name.')
	.max(120, 'Use at most 120 characters.');

/** One ticked box arrives as a bare value, several as a list, none not at all. */
export const manyOf = <T extends z.ZodType<string, string>>(one: T, none: string) =>
	z
		.union([z.array(one), one.transform((value) => [value])], none)
		.transform((values) => [...new Set(values)]);

export const rowId = z.uuid();
