/**
 * Limits as figures for people: grouped by thousands, as short as they can be while each is told from the
 * next and, where it has at most seven digits, exact. From 10^15 on and below 10^-9 with an exponent: "1E20".
 */
export function limitWords(limits: readonly number[]): string[] {
	for (let digits = 5; digits <= 15; digits++) {
		const words = limits.map((limit) => limitWord(limit, digits));
		if (new Set(words).size === limits.length) return words;
	}
	return limits.map(String);
}

/** Beyond these a figure written out is a row of noughts that nobody counts. */
const [tiny, vast] = [1e-9, 1e15];

function limitWord(limit: number, digits: number): string {
	const exact = Number(limit.toPrecision(7)) === limit;
	const size = Math.abs(limit);
	return limit.toLocaleString('en-GB', {
		maximumSignificantDigits: exact ? 7 : digits,
		notation: size >= vast || (size > 0 && size < tiny) ? 'scientific' : 'standard',
	});
}

/**
 * Every class in words: "up to 1,200", "1,200 to 3,400", "over 3,400". The ends stay open, so that the
 * words never tell the least and the greatest figure of a single region.
 */
export function rangeWords(limits: readonly number[]): string[] {
	const words = limitWords(limits);
	if (words.length === 0) return ['all figures'];
	return [
		`up to ${words[0]}`,
		...words.slice(1).map((word, i) => `${words[i]} to ${word}`),
		`over ${words[words.length - 1]}`,
	];
}
