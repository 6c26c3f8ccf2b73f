import type { RegionMatch } from '../../engines/boundaries/recut/index.ts';
import type { CarriedValues, Theme } from '../../engines/measures/index.ts';
import type { CarriedRow } from '../../schemas/recut.ts';

interface CarriedMeasure {
	carried: { name: string };
	/** null for a measure of words, which no theme shows */
	numbers: CarriedValues<number> | null;
}

/**
 * What becomes of the figures that the sheet shows: how many regions have one on the new boundaries, and how
 * many lost it and are hatched. A theme stands with its measure, its limits and its ramp.
 */
export function themeRow(
	{ measure, per }: Theme,
	measures: readonly CarriedMeasure[],
	{ after }: Pick<RegionMatch, 'after'>,
): CarriedRow[] {
	const names = [measure, ...(per.kind === 'measure' ? [per.measure] : [])];
	const numbers = names.map(
		(name) => measures.find(({ carried }) => carried.name === name)?.numbers,
	);
	const subject = `The theme of ${measure}`;
	const row: Omit<CarriedRow, 'outcome' | 'words'> = {
		...{ stage: 'draft', what: 'theme', keys: [], now: [] },
	};
	if (numbers.some((one) => !one)) {
		const words = `${subject} stands, but has no figures of the boundaries that it was on.`;
		return [{ ...row, outcome: 'dropped', words }];
	}
	return [
		{ ...row, outcome: 'changed', words: `${subject} ${became(numbers, after.keys.length)}` },
	];
}

function became(numbers: (CarriedValues<number> | null | undefined)[], regions: number): string {
	const told = Array.from({ length: regions }, (_, i) =>
		numbers.every((one) => one && one.values[i] !== null),
	).filter(Boolean).length;
	const lost = Math.max(...numbers.map((one) => one?.lost ?? 0));
	const summed = Math.max(...numbers.map((one) => one?.summed ?? 0));
	return [
		`keeps its limits and tells ${told} of ${regions} regions`,
		summed > 0 ? `${summed} of them by figures added up from merged regions` : '',
		lost > 0
			? `${lost} ${lost === 1 ? 'has lost its figure and is' : 'have lost theirs and are'} hatched as no data`
			: 'none has lost its figure',
	]
		.filter(Boolean)
		.join(', ')
		.concat('.');
}
