/** A key as it stands in a sentence. */
export const quoted = (key: string) => `"${key}"`;

/** A share as people read it: one decimal, and 100 % only where it rounds to that. */
export const inPercent = (share: number) => `${Number((100 * share).toFixed(1))} %`;

const mostListed = 5;

/** Up to five in a row, and how many more there are. */
export function listedKeys(keys: string[]): string {
	if (keys.length <= 1) return keys.join('');
	if (keys.length <= mostListed) return `${keys.slice(0, -1).join(', ')} and ${keys.at(-1)}`;
	return `${keys.slice(0, mostListed).join(', ')} and ${keys.length - mostListed} more`;
}
