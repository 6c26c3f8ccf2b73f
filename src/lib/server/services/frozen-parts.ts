import { freezeTheme, type EditionInput } from '../../engines/editions/index.ts';
import type { FurtherValues } from '../../engines/exports/index.ts';
import type { Theme } from '../../engines/measures/index.ts';
import type { SheetTheme } from '../../engines/sheet/index.ts';
import type { Db } from '../database/connection.ts';
import type { BoundaryView } from './boundary-view.ts';
import { issuedFurther } from './further-values.ts';
import { territoriesOnSheet } from './territories-on-sheet.ts';
import { themeToIssue } from './theme-on-sheet.ts';

/** What an edition freezes of that which stands beside its draft, and what its files are made from. */
export interface FrozenParts {
	content: Pick<EditionInput, 'theme' | 'territories'>;
	shown: SheetTheme | null;
	/** from the content itself, so that files made later are the same */
	further: FurtherValues;
}

export async function frozenParts(
	db: Db,
	sheetId: string,
	view: BoundaryView,
	asked: Theme | null,
): Promise<FrozenParts> {
	const on = await themeToIssue(db, sheetId, view, asked);
	const theme = on ? freezeTheme(view.keys, on.shown, on.figuresAt, on.figures) : undefined;
	const territories = (await territoriesOnSheet(db, sheetId, view)) ?? undefined;
	return {
		content: { theme, territories },
		shown: on?.shown ?? null,
		further: issuedFurther(view.keys, { theme, territories }),
	};
}
