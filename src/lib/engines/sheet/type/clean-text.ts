/**
 * One line of text that may be drawn: control characters, line separators, directional overrides and
 * lone surrogates removed, runs of white space made one space. XML 1.0 (section 2.2) forbids most of
 * these, and overrides could make a name read as another.
 */
export function cleanText(text: string): string {
	return text
		.replace(/[\t\n\r\u2028\u2029]+/g, ' ')
		.replace(/[\p{Cc}\p{Cs}\u200b\u200e\u200f\u202a-\u202e\u2060-\u2069\ufeff\ufffe\uffff]/gu, '')
		.replace(/ +/g, ' ')
		.trim();
}
