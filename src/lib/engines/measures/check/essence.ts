/** Letters with a stroke or joined, which have no parts to be taken apart into. */
const parts = new Map(
	[...'ß:ss æ:ae œ:oe ø:o đ:d ð:d þ:th ł:l ı:i ħ:h'.split(' ')].map((pair) => {
		const [letter, plain] = pair.split(':');
		return [letter, plain];
	}),
);

/** What is left of a text without case, accents, spaces and punctuation, letter by letter. */
export function essence(text: string): string {
	let left = '';
	for (const character of text) {
		for (const part of character.normalize('NFKD')) {
			const code = part.codePointAt(0) ?? 0;
			if (code >= 0x300 && code <= 0x36f) continue;
			for (const small of part.toLowerCase()) {
				const accent = (small.codePointAt(0) ?? 0) >= 0x300 && (small.codePointAt(0) ?? 0) <= 0x36f;
				if (!accent && /[\p{L}\p{N}\p{M}]/u.test(small)) left += parts.get(small) ?? small;
			}
		}
	}
	return left;
}

/** The digits of a whole number from its first that is not 0; null for any other text. */
export function significant(digits: string): string | null {
	if (!digits) return null;
	let start = 0;
	for (let i = 0; i < digits.length; i++) {
		const code = digits.charCodeAt(i);
		if (code < 48 || code > 57) return null;
		if (start === i && code === 48 && i < digits.length - 1) start++;
	}
	return digits.slice(start);
}
