import type { FrozenTerritories } from './frozen-territories.ts';
import type { FrozenTheme } from './frozen-theme.ts';

/** Region key -> its range in words: class numbers say nothing once limits have moved. */
export const classRanges = (theme: FrozenTheme | undefined): Record<string, string> =>
	theme
		? Object.fromEntries(
				Object.entries(theme.classes).map(([key, one]) => [key, theme.inks[one].name]),
			)
		: {};

/** When the figures were taken over, and the figures themselves where the other theme holds some too. */
export const figuresCompared = (
	{ figuresAt, figures }: FrozenTheme,
	other: FrozenTheme,
): Record<string, unknown> => ({
	'taken over': figuresAt,
	...(figures && other.figures
		? Object.fromEntries(
				Object.entries(figures).map(([key, figure]) => [`figure of ${key}`, figure]),
			)
		: {}),
});

/** The territory of every region, and what each territory is called. */
export const territoriesCompared = (
	territories: FrozenTerritories | undefined,
): Record<string, string> =>
	territories
		? Object.fromEntries([
				...Object.entries(territories.regions).map(([key, one]) => [`region ${key}`, one]),
				...Object.entries(territories.names).map(([key, name]) => [`name of ${key}`, name]),
			])
		: {};
