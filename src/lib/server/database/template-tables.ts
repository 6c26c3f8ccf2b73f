import type { ColumnType, Generated } from 'kysely';
import type { Palette } from '../../engines/palettes/palette.ts';
import type { SheetLayout } from '../../engines/sheet/layout.ts';
import type { LayoutTemplate } from '../../engines/sheet/layout/template.ts';
import type { Moment } from './columns.ts';

/** Row type of layouts that a team keeps as patterns. */
export interface LayoutTemplateTable {
	id: Generated<string>;
	team_id: string;
	name: string;
	fields: ColumnType<LayoutTemplate, string, string>;
	ratio: number | null;
	palette: ColumnType<Palette | null, string | null, string | null>;
	revision: Generated<number>;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
}

/** What a template says. */
export interface TemplateContent {
	fields: LayoutTemplate;
	ratio: number | null;
	palette: Palette | null;
}

/** The parts of a stored draft that a template touches. */
export interface SeriesParts {
	layout: SheetLayout;
	palette: Palette;
}
