/**
 * A path on this site that a form may send people back to: anything else, such as another site's address
 * written as `//host`, becomes the fallback.
 */
export function placeOnThisSite(wanted: unknown, fallback = '/teams'): string {
	if (typeof wanted !== 'string' || !wanted.startsWith('/')) return fallback;
	const base = 'http://here.invalid';
	if (!URL.canParse(wanted, base)) return fallback;
	const url = new URL(wanted, base);
	const path = url.pathname + url.search;
	// Dots may fold away and leave a path that reads as another host: `/.//host` becomes `//host`.
	return url.origin === base && !path.startsWith('//') ? path : fallback;
}
