import { hashed } from './random.ts';
import type { District } from './survey.ts';

/** What the distributor knows of a district. */
export interface Outlets {
	/** bakeries, canteens and shops served */
	outlets: number;
	/** hours of visits and travel between them in a year */
	hours: number;
	/** what they might buy in a year, in thousands of skells, the republic's money */
	potential: number;
}

/** Denser towns have fewer outlets for each person: the count grows more slowly than the people. */
export function outletsOf(districts: readonly District[], seed: number): Outlets[] {
	return districts.map(({ population }, district) => {
		const chance = (what: number) => hashed(district, what, seed);
		const outlets = Math.max(
			1,
			Math.round(0.9 * (population / 1000) ** 0.55 * (0.8 + 0.4 * chance(11))),
		);
		const hours = Math.round(outlets * (10 + 8 * chance(12)));
		const potential = Math.round(outlets * (38 + 70 * chance(13) ** 2)) / 2;
		return { outlets, hours, potential };
	});
}
