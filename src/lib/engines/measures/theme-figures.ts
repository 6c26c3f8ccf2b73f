import type { Theme } from './theme.ts';

/** What a theme is computed from, one entry a region. */
export interface ThemeGround {
	/** the measure; null where it is missing */
	values: readonly (number | null)[];
	areasKm2: ArrayLike<number>;
	/** the measure that it is divided by; null where the theme names none */
	denominators: readonly (number | null)[] | null;
}

export interface ThemeFigures {
	/** what is told of each region; null where nothing is */
	figures: (number | null)[];
	/** regions with a count above 0 and below the limit of suppression */
	suppressed: number[];
	/** regions without a value, or with nothing that it could be divided by */
	noData: number[];
	/** of these, the ones that have a value but nothing to divide it by */
	noDenominator: number[];
}

/**
 * The figures of a theme: the measure as it is, per square kilometre, or per another measure times a number.
 * A region whose count is small is suppressed before anything is divided; one that is divided by nought,
 * by less, or by a missing value is not told. Nothing is guessed.
 */
export function themeFigures(
	{ per, suppressBelow }: Pick<Theme, 'per' | 'suppressBelow'>,
	{ values, areasKm2, denominators }: ThemeGround,
): ThemeFigures {
	const told: ThemeFigures = { figures: [], suppressed: [], noData: [], noDenominator: [] };
	values.forEach((value, region) => {
		told.figures.push(null);
		if (value === null || !Number.isFinite(value)) return void told.noData.push(region);
		if (suppressBelow !== null && value > 0 && value < suppressBelow) {
			return void told.suppressed.push(region);
		}
		const by = divisor(per, areasKm2[region], denominators?.[region]);
		const figure = by === null ? null : (value / by) * (per.kind === 'measure' ? per.times : 1);
		// divided by next to nothing, a figure grows past every number that there is
		if (figure === null || !Number.isFinite(figure)) {
			told.noData.push(region);
			return void told.noDenominator.push(region);
		}
		told.figures[region] = figure;
	});
	return told;
}

function divisor(per: Theme['per'], km2: number, other: number | null | undefined): number | null {
	if (per.kind === 'none') return 1;
	const by = per.kind === 'area' ? km2 : other;
	return by !== null && by !== undefined && by > 0 && Number.isFinite(by) ? by : null;
}
