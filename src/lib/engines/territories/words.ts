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

/** A load as people read it: `12,340`, `12.3`. */
export function amount(value: number): string {
	const places = Math.abs(value) >= 1000 ? 0 : Math.abs(value) >= 10 ? 1 : 3;
	const [whole, part] = String(Number(value.toFixed(places))).split('.');
	const grouped = /^-?\d+$/.test(whole) ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
	return part ? `${grouped}.${part}` : grouped;
}

/** A share as a percentage with one decimal, rounded up, so that `x would do` stays true. */
export const percentUp = (share: number) => `${Math.ceil(share * 1000 - 1e-6) / 10} %`;

/** `1 unit`, `7 units`. */
export const counted = (count: number, one: string, many: string) =>
	`${amount(count)} ${count === 1 ? one : many}`;
