import type { Impossible, TerritoryProblem } from './problem.ts';
import { listed } from './words.ts';

/** The answer when a measure has no usable value somewhere or nothing to share at all, else null. */
export function missingValues({ measures }: TerritoryProblem): Impossible | null {
	for (const { name, values } of measures) {
		const units: number[] = [];
		values.forEach((value, u) => {
			if (!(value >= 0 && value < Infinity)) units.push(u);
		});
		if (units.length > 0) return missing(units, `${name} has no value of 0 or more at `);
	}
	for (const { name, values, tolerance } of measures) {
		if (tolerance === null) continue;
		const total = values.reduce((sum, value) => sum + value, 0);
		if (total > 0 && total < Infinity) continue;
		const units = Array.from(values.keys());
		const why = total > 0 ? 'adds up to too large a number' : 'is 0';
		return missing(units, `${name} ${why}, so no territory has a target, over `);
	}
	return null;
}

function missing(units: number[], start: string): Impossible {
	return {
		status: 'impossible',
		reason: 'missing-value',
		message: `${start}${units.length} ${units.length === 1 ? 'unit' : 'units'}: ${listed(units)}.`,
		witness: { units, territories: [] },
		relief: [],
	};
}
