import type { Palette } from '../palettes/palette.ts';
import {
	templateDifferences,
	withTemplate,
	type LayoutTemplate,
	type TemplateDifference,
} from '../sheet/layout/template.ts';
import type { Draft } from './draft.ts';

/** A team's template as drafts are set by it. */
export interface SetBy {
	id: string;
	name: string;
	fields: LayoutTemplate;
	/** null: each sheet keeps its own */
	ratio: number | null;
	palette: Palette | null;
}

type Touched = Pick<Draft, 'layout' | 'palette'>;

/**
 * A draft set by a template. A palette with fewer inks than the sheet's would leave regions without one, so the
 * sheet keeps its own then; `templateDiffers` goes on telling it.
 */
export function setByTemplate<D extends Touched>(draft: D, template: SetBy): D {
	const { id, name, fields, ratio, palette } = template;
	const layout = withTemplate(draft.layout, fields, { id, name });
	const frame = ratio === null ? layout.frame : { ...layout.frame, ratio };
	const fits = palette && palette.inks.length >= draft.palette.inks.length;
	return {
		...draft,
		layout: { ...layout, frame },
		palette: fits ? structuredClone(palette) : draft.palette,
	};
}

/** Where a draft is not as a template says, ratio and palette included where the template has them. */
export function templateDiffers(
	{ layout, palette }: Touched,
	template: Omit<SetBy, 'id' | 'name'>,
): TemplateDifference[] {
	const found = templateDifferences(layout, template.fields);
	const { ratio } = layout.frame;
	if (template.ratio !== null && template.ratio !== ratio)
		found.push({ field: 'frame.ratio', now: ratio, template: template.ratio });
	const hexes = (one: Palette) => one.inks.map((ink) => JSON.stringify(ink)).join();
	if (template.palette && hexes(template.palette) !== hexes(palette))
		found.push({ field: 'palette', now: palette.name, template: template.palette.name });
	return found;
}
