/**
 * A path on this site that a form may send people back to: anything else, such as another site's address
 * written as `//host`, becomes the fallback.
 */
export function placeOnThisSite(wanted: unknown, fallback = '/teams'): string {
	if (typeof wanted !== 'string' || !wanted.startsWith('/')) return fallback;
	const base = 'http://here.invalid';
	if (!URL.canParse(wanted, base)) return fallback;
	const url = new URL(wanted, base);
	return url.origin === base ? url.pathname + url.search : fallback;
}
