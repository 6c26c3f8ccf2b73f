import type { Finding } from './finding.ts';

/** So many of a kind are told one by one. */
export const mostTold = 200;

/** A finding for each of the first, and one for all the rest together; `items` come worst first. */
export function toldEach<Item>(items: Item[], tell: (item: Item) => Finding): Finding[] {
	const findings = items.slice(0, mostTold).map(tell);
	const rest = items.slice(mostTold);
	if (rest.length === 0) return findings;
	const others = rest.map(tell);
	const { code, severity, at } = others[0];
	const regions = [...new Set(others.flatMap((finding) => finding.regions))];
	const message = `There are ${rest.length} smaller ones like this.`;
	return [...findings, { code, severity, message, regions, at }];
}
