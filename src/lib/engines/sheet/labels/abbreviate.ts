/** Words in at least so many names, and in at least this share of them, say little of any one. */
const leastTimes = 3;
const leastShare = 0.02;
/** Longest word that is left whole, and how much of a longer one is kept. */
const longestWhole = 7;
const kept = 4;

const wordsOf = (name: string): string[] => name.split(/\s+/u).filter(Boolean);

/** Words that many names share: "District", "Saint", "North". */
function commonWords(names: readonly string[]): Set<string> {
	const counts = new Map<string, number>();
	for (const name of names) {
		const words = wordsOf(name);
		if (words.length < 2) continue;
		for (const word of new Set(words)) counts.set(word, (counts.get(word) ?? 0) + 1);
	}
	const asked = Math.max(leastTimes, names.length * leastShare);
	return new Set([...counts].filter(([, times]) => times >= asked).map(([word]) => word));
}

/** A word cut after a consonant, with a full stop: Corvembre, Corv. */
function cut(word: string, length: number): string {
	const letters = [...word];
	if (letters.length <= Math.max(length + 1, 3)) return word;
	let end = length;
	while (
		end < letters.length - 2 &&
		/[aeiouyàâäáãåæéèêëíìîïóòôöõøœúùûüýαεηιουωаеёиоуыэюяіїє]/iu.test(letters[end - 1])
	) {
		end++;
	}
	return `${letters.slice(0, end).join('')}.`;
}

/**
 * Proposals for names that are too long, to be looked at before they are taken. In: all names of a
 * sheet. Out: for each a shorter text, or null where the rule finds none: words that many names share
 * are cut to their first letters, then long words after a consonant. The rule is our own, no source.
 */
export function proposeAbbreviations(names: readonly string[]): (string | null)[] {
	const common = commonWords(names);
	return names.map((name) => {
		const short = wordsOf(name)
			.map((word) => {
				if (common.has(word)) return cut(word, 1);
				return [...word].length > longestWhole ? cut(word, kept) : word;
			})
			.join(' ');
		return short && [...short].length < [...name].length ? short : null;
	});
}
