import type { Relief, TerritoryProblem } from './problem.ts';

/** A rule that ties one unit to one territory. */
export interface Pin {
	unit: number;
	territory: number;
	kind: 'lock' | 'base' | 'frozen';
}

/** Every rule that ties a unit to a territory: frozen ones first, then bases, then locks. */
export function pinsOf({ today, territories, locks }: TerritoryProblem): Pin[] {
	const pins: Pin[] = [];
	today.forEach((territory, unit) => {
		if (territory >= 0 && territories[territory].frozen)
			pins.push({ unit, territory, kind: 'frozen' });
	});
	territories.forEach(({ base, closing }, territory) => {
		if (base >= 0 && !closing) pins.push({ unit: base, territory, kind: 'base' });
	});
	locks?.forEach((territory, unit) => {
		if (territory >= 0) pins.push({ unit, territory, kind: 'lock' });
	});
	return pins;
}

export function pinWords({ unit, territory, kind }: Pin): string {
	if (kind === 'lock') return `#${unit} is locked to @${territory}`;
	if (kind === 'base') return `#${unit} is the base of @${territory}`;
	return `#${unit} belongs to @${territory}, which is frozen`;
}

/** What takes the rule away: nothing takes a base away. */
export function pinReliefs({ unit, territory, kind }: Pin): Relief[] {
	if (kind === 'lock') return [{ kind: 'unlock', unit }];
	return kind === 'frozen' ? [{ kind: 'unfreeze', territory }] : [];
}
