import { hash, verify } from '@node-rs/argon2';

/** argon2id with the parameters of the OWASP password storage cheat sheet (19 MiB, 2 passes, 1 lane). */
const options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string): Promise<string> => hash(password, options);

let stranger: Promise<string> | null = null;

/**
 * Whether the password fits. Without a hash (nobody of that name, or no password set) as much work is done
 * for nothing, so that the time taken does not tell who exists.
 */
export async function passwordFits(
	kept: string | null | undefined,
	typed: string,
): Promise<boolean> {
	if (kept) return verify(kept, typed);
	stranger ??= hashPassword('nobody has this password');
	await verify(await stranger, typed);
	return false;
}
