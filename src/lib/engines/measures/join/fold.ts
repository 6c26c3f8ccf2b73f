/** Letters that are not taken apart by normalisation, as they are usually written without their marks. */
const plain: Record<string, string> = {
	ß: 'ss',
	æ: 'ae',
	œ: 'oe',
	ø: 'o',
	đ: 'd',
	ð: 'd',
	þ: 'th',
	ł: 'l',
	ı: 'i',
	ħ: 'h',
};

/**
 * A text without case, accents, spaces and punctuation: two that fold alike are taken for the same word
 * written differently. Source: compatibility decomposition of Unicode (UAX 15); which marks are left out is
 * a house rule.
 */
export function fold(text: string): string {
	if (/^[0-9a-z]*$/.test(text)) return text;
	return text
		.normalize('NFKD')
		.replace(/[\u0300-\u036f]/g, '')
		.toLowerCase()
		.replace(/[ßæœøđðþłıħ]/g, (letter) => plain[letter])
		.replace(/[^\p{L}\p{N}\p{M}]/gu, '');
}

/** A whole number without the zeros before it, null for anything else. */
export function withoutZeros(text: string): string | null {
	return /^\d+$/.test(text) ? text.replace(/^0+(?=\d)/, '') : null;
}
