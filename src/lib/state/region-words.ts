import type { TerritoryDesk } from './territories.svelte';
import { amount } from './territory-words';

/** A region in accessible words while territories are planned: whose it is, who serves it, what it weighs. */
export function regionWords(plan: TerritoryDesk, region: number): string {
	const { desk, figures, document } = plan;
	const entry = plan.of(region);
	const key = desk.sheet.regions.key[region];
	const words = [
		desk.nameOf(region),
		entry?.name ?? 'no territory',
		entry?.person || (entry ? 'nobody serves it' : ''),
		...figures.map(({ name, unit, values }) =>
			unit ? amount(values[region], unit) : `${name} ${amount(values[region], '')}`,
		),
		...document.territories.flatMap(({ base, name }) => (base === key ? `base of ${name}` : [])),
		Object.hasOwn(document.locks, key) ? 'locked' : '',
	];
	return words.filter(Boolean).join(', ');
}
