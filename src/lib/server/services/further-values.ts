import {
	thawFigures,
	thawTerritories,
	type EditionContent,
	type FrozenTerritories,
} from '../../engines/editions/index.ts';
import type { FurtherValues } from '../../engines/exports/index.ts';
import type { ThemeOnSheet } from './theme-on-sheet.ts';

/** Territories and figures for the tables of an edition: as they were issued. */
export const issuedFurther = (
	keys: readonly string[],
	{ theme, territories }: Pick<EditionContent, 'theme' | 'territories'>,
): FurtherValues => ({
	figures: theme ? figuresOf(theme.title, thawFigures(keys, theme)) : null,
	territories: territories ? thawTerritories(keys, territories) : null,
});

/** The same of a draft: as they are today. */
export const presentFurther = (
	keys: readonly string[],
	theme: ThemeOnSheet | null,
	territories: FrozenTerritories | null,
): FurtherValues => ({
	figures: theme && figuresOf(theme.shown.title, theme.figures),
	territories: territories && thawTerritories(keys, territories),
});

const figuresOf = (title: string, values: (number | null)[] | null): FurtherValues['figures'] =>
	values && { title, values };
