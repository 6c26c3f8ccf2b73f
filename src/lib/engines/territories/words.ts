const shown = 5;

/** `#3, #4 and 7 more`: units as messages name them. */
export const listed = (units: readonly number[]) => listedAs('#', units);

/** `@3, @4 and 7 more`: territories as messages name them. */
export const listedTerritories = (territories: readonly number[]) => listedAs('@', territories);

function listedAs(sign: string, numbers: readonly number[]): string {
	const names = numbers.slice(0, shown).map((n) => `${sign}${n}`);
	const more = numbers.length - names.length;
	if (more > 0) return `${names.join(', ')} and ${more} more`;
	if (names.length < 2) return names.join('');
	return `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
}
