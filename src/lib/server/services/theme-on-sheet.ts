import { createHash } from 'node:crypto';
import {
	checkClasses,
	limitsHold,
	themeClasses,
	type Theme,
} from '../../engines/measures/index.ts';
import { sheetTheme, type SheetTheme } from '../../engines/sheet/index.ts';
import type { DeskTheme, ThemeTrouble } from '../../schemas/desk-theme.ts';
import type { Db } from '../database/connection.ts';
import { readMeasuresNamed, type NamedMeasure } from '../repositories/measures.repository.ts';
import type { BoundaryView } from './boundary-view.ts';
import { dayInWords } from './day-in-words.ts';
import { CheckFailed } from './outcome-of-colouring.ts';
import { Conflict, Unfit } from './outcomes.ts';

/**
 * What a theme comes to on a sheet: classes and ranges, which everybody who sees the sheet may see. Figures
 * are read here and go no further, unless the theme says that files carry them.
 */
export interface ThemeOnSheet {
	shown: SheetTheme;
	/** why no region has a class; null while all is well */
	trouble: ThemeTrouble | null;
	/** whether the limits are what the method gives for today's figures */
	holds: boolean;
	/** ISO 8601 */
	figuresAt: string | null;
	/** for files, suppressed ones left out; null unless the theme and the tables let files carry them */
	figures: (number | null)[] | null;
}

export async function themeOnSheet(
	db: Db,
	sheetId: string,
	view: BoundaryView,
	theme: Theme | null,
): Promise<ThemeOnSheet | null> {
	if (!theme) return null;
	const { per } = theme;
	const names = per.kind === 'measure' ? [theme.measure, per.measure] : [theme.measure];
	const rows = await readMeasuresNamed(db, sheetId, names);
	const measure = rows.find(({ name }) => name === theme.measure);
	const by = per.kind === 'measure' ? rows.find(({ name }) => name === per.measure) : null;
	const trouble = troubleOf(view, [measure, by]);
	const nothing = view.keys.map(() => null);
	const ground = {
		values: (!trouble && measure?.values) || nothing,
		areasKm2: view.areasKm2,
		denominators: by === null ? null : (!trouble && by?.values) || nothing,
	};
	const classes = themeClasses(theme, ground);
	const faults = checkClasses(classes.figures, classes.classes, theme.breaks);
	if (faults.length > 0) throw new CheckFailed(faults.slice(0, 5).join(' '));
	const holds = !trouble && limitsHold(theme, ground);
	const takenAt = measure?.taken_at ?? null;
	const date = takenAt && dayInWords(takenAt);
	const source = { table: measure?.table_name ?? null, date, holds };
	return {
		shown: sheetTheme(theme, classes, source),
		...{ trouble, holds, figuresAt: takenAt?.toISOString() ?? null },
		figures: theme.figuresInFiles && !isConfidential(rows) ? classes.figures : null,
	};
}

const isConfidential = (rows: readonly Pick<NamedMeasure, 'confidential'>[]): boolean =>
	rows.some(({ confidential }) => confidential);

/** A measure that is gone, or in the order of earlier boundaries, tells nothing of these regions. */
function troubleOf(
	{ set }: BoundaryView,
	measures: (NamedMeasure | null | undefined)[],
): ThemeTrouble | null {
	if (measures.includes(undefined)) return 'gone';
	const stale = measures.some((one) => one && one.boundary_set_id !== set.id);
	return stale ? 'stale' : null;
}

/** Changes whenever a sheet would be drawn in other classes; '' without a theme. */
export function themeTag(theme: SheetTheme | null): string {
	if (!theme) return '';
	const { classes, inks, title, note } = theme;
	const said = JSON.stringify([[...classes], inks, title, note]);
	return `-${createHash('sha256').update(said).digest('hex').slice(0, 16)}`;
}

/** As its page is given it. */
export const deskTheme = (theme: ThemeOnSheet | null): DeskTheme | null =>
	theme && {
		...theme.shown,
		classes: [...theme.shown.classes],
		...{ trouble: theme.trouble, holds: theme.holds, figuresAt: theme.figuresAt },
	};

/** What an edition freezes. Refused where no region has a class, which nobody means to issue. */
export async function themeToIssue(
	db: Db,
	sheetId: string,
	view: BoundaryView,
	theme: Theme | null,
): Promise<ThemeOnSheet | null> {
	const on = await themeOnSheet(db, sheetId, view, theme);
	if (on && !on.trouble && theme?.figuresInFiles && !on.figures) throw confidentialFigures();
	if (!on?.trouble) return on;
	const why =
		on.trouble === 'gone'
			? 'is no measure of this sheet any more'
			: 'is joined to earlier boundaries';
	throw new Conflict(
		'theme-without-figures',
		`The sheet shows ${theme?.measure}, which ${why}. Join it again, or show the colouring instead.`,
	);
}

const confidentialFigures = () =>
	new Conflict(
		'confidential-figures',
		'The theme writes its figures into files, and they are marked as confidential. Leave them out of files, or join them again without that mark.',
	);

/** Refuses a theme of measures that the sheet has not, or that would write confidential ones into files. */
export async function requireThemeMeasures(db: Db, sheetId: string, theme: Theme): Promise<void> {
	const { measure, per } = theme;
	const names = per.kind === 'measure' ? [measure, per.measure] : [measure];
	const rows = await readMeasuresNamed(db, sheetId, names);
	const unknown = names.find((name) => !rows.some((row) => row.name === name));
	if (unknown !== undefined) {
		throw new Unfit('unknown-measure', `The sheet has no measure ${JSON.stringify(unknown)}.`);
	}
	if (theme.figuresInFiles && isConfidential(rows)) throw confidentialFigures();
}
