/**
 * Whether brackets and braces of a JSON text nest deeper than so many. Texts that do are made to keep a
 * parser busy: fifty million open brackets take it minutes. Strings are passed over.
 */
export function nestsDeeper(text: string, most: number): boolean {
	let depth = 0;
	for (let i = 0; i < text.length; i++) {
		const sign = text.charCodeAt(i);
		if (sign === QUOTE) i = endOfString(text, i);
		else if (sign === OPEN_LIST || sign === OPEN_FIELDS) {
			if (++depth > most) return true;
		} else if (sign === CLOSE_LIST || sign === CLOSE_FIELDS) depth--;
	}
	return false;
}

const QUOTE = 34;
const BACKSLASH = 92;
const [OPEN_LIST, CLOSE_LIST, OPEN_FIELDS, CLOSE_FIELDS] = [91, 93, 123, 125];

/** Where the string that starts here ends; the end of the text when it does not. */
function endOfString(text: string, start: number): number {
	let i = start + 1;
	while (i < text.length && text.charCodeAt(i) !== QUOTE) {
		i += text.charCodeAt(i) === BACKSLASH ? 2 : 1;
	}
	return i;
}
