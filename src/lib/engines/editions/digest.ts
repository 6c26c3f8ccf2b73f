import { canonicalJson } from './canonical-json.ts';
import type { EditionContent } from './edition-content.ts';

/**
 * SHA-256 (FIPS 180-4) over the UTF-8 bytes of the canonical JSON, as 64 lower-case hex digits. The
 * same content gives the same digest whatever the order of its members, before and after storage.
 */
export async function digestOf(content: EditionContent): Promise<string> {
	const bytes = new TextEncoder().encode(canonicalJson(content));
	const hash = new Uint8Array(await crypto.subtle.digest('SHA-256', bytes));
	return Array.from(hash, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

/** Whether an edition is still what was issued. */
export async function verifyEdition(content: EditionContent, digest: string): Promise<boolean> {
	return (await digestOf(content)) === digest;
}
