import { Refused } from './outcomes.ts';

/**
 * The key of the region that somebody means by a key or, letter for letter but for capitals, a name.
 * @param field the form's field that the words were typed into
 */
export function regionByWords(
	keys: readonly string[],
	names: readonly string[],
	words: string,
	field: string,
): string {
	if (keys.includes(words)) return words;
	const small = words.toLocaleLowerCase();
	const named = keys.filter((_, region) => names[region].toLocaleLowerCase() === small);
	if (named.length === 1) return named[0];
	if (named.length > 1) {
		const all = named.slice(0, 5).join(', ');
		throw new Refused(`Several regions are called so; give the key: ${all}.`, field);
	}
	throw new Refused('No region has this key or this name.', field);
}
