import { createHash, randomBytes } from 'node:crypto';

/** A random secret for a link, a token or a session: 256 bits, safe in addresses. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** What is kept of a secret. A plain digest is enough for 256 random bits. */
export const digestOf = (secret: string): Buffer => createHash('sha256').update(secret).digest();
