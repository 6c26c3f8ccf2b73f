import type { SheetLayout } from '../layout.ts';

/**
 * A layout as a pattern for other sheets. What belongs to one sheet only stays out of it: its title, its level
 * above, texts on it, and whatever names regions or a place on the ground.
 */
const ownOf = {
	frame: ['parallels', 'centre', 'ratio', 'shiftMm', 'insetChoices'],
	lettering: ['first', 'nameColumn', 'abbreviations', 'placed', 'hidden'],
	lines: [],
	collar: ['legendTitle', 'blocks', 'template'],
} as const satisfies { [P in Part]: readonly (keyof SheetLayout[P])[] };

const plain = [
	...['paper', 'orientation', 'marginMm', 'projection'],
	...['labels', 'legend', 'scaleBar', 'credits'],
] as const satisfies readonly string[];

type Part = 'frame' | 'lettering' | 'lines' | 'collar';
const parts = ['frame', 'lettering', 'lines', 'collar'] as const;

/** Field by field: `paper`, `lines.outer`. A template of an earlier time lacks what could not be said then. */
export type LayoutTemplate = Record<string, unknown>;

/** The fields of a layout that a template holds. */
export function templateOf(layout: SheetLayout): LayoutTemplate {
	const whole = layout as unknown as Record<string, unknown>;
	const fields = plain.map((name) => [name, whole[name]]);
	for (const part of parts) {
		const own: readonly string[] = ownOf[part];
		for (const [name, value] of Object.entries(layout[part]))
			if (!own.includes(name)) fields.push([`${part}.${name}`, value]);
	}
	return Object.fromEntries(fields.map(([name, value]) => [name, structuredClone(value)]));
}

/**
 * A layout set by a template: what the template does not say stays as it is. Parallels and centre are of the
 * projection that was chosen, so they go where the projection changes.
 */
export function withTemplate(
	layout: SheetLayout,
	template: LayoutTemplate,
	mark: { id: string; name: string } | null,
): SheetLayout {
	const next = structuredClone(layout) as unknown as Record<string, Record<string, unknown>>;
	const known = templateOf(layout);
	for (const [field, value] of Object.entries(template)) {
		if (!Object.hasOwn(known, field)) continue;
		const [part, name] = field.split('.');
		if (name === undefined) Object.assign(next, { [part]: structuredClone(value) });
		else next[part][name] = structuredClone(value);
	}
	const set = next as unknown as SheetLayout;
	const frame =
		set.projection === layout.projection
			? set.frame
			: { ...set.frame, parallels: null, centre: null };
	return { ...set, frame, collar: { ...set.collar, template: mark } };
}

export interface TemplateDifference {
	/** as in `LayoutTemplate` */
	field: string;
	/** on the sheet, and by the template */
	now: unknown;
	template: unknown;
}

/** Where a layout is not as its template says, in the order of its fields. */
export function templateDifferences(
	layout: SheetLayout,
	template: LayoutTemplate,
): TemplateDifference[] {
	return Object.entries(templateOf(layout)).flatMap(([field, now]) =>
		field in template && !alike(now, template[field])
			? [{ field, now, template: template[field] }]
			: [],
	);
}

/** Values that could be written as JSON; the order of an object's fields says nothing. */
function alike(one: unknown, two: unknown): boolean {
	if (typeof one !== 'object' || typeof two !== 'object' || !one || !two) return one === two;
	const [a, b] = [Object.entries(one), Object.entries(two)];
	return (
		Array.isArray(one) === Array.isArray(two) &&
		a.length === b.length &&
		a.every(([name, value]) => alike(value, (two as Record<string, unknown>)[name]))
	);
}
