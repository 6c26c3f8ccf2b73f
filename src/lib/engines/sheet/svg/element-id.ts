/**
 * An element id made from a region's key: letters and digits stay, any other character becomes its
 * code point between underscores. Different keys give different ids, and the same key always the same
 * one, so scripts and styles may rely on them. Valid as an XML name (XML 1.0, section 2.3) and in a
 * style sheet without escapes.
 */
export function elementId(key: string, prefix = ''): string {
	const safe = key.replace(/[^A-Za-z0-9]/gu, (one) => `_${one.codePointAt(0)!.toString(16)}_`);
	return `${prefix}r-${safe}`;
}
