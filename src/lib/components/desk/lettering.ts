import { paintSvg, shapeLayers, type ShapeLayer } from '$lib/engines/sheet';
import type { Drawing } from '$lib/engines/sheet/drawing';

/** Put before the ids of the sheet's elements, which share the page with others. */
export const idPrefix = 'sheet-';

export function parseSvg(text: string): SVGSVGElement {
	const root = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
	if (root.localName !== 'svg') throw new Error('the sheet could not be read as SVG');
	return root as unknown as SVGSVGElement;
}

/** A drawing without fills and lines: names, legend, collar, and the shapes of some layers. */
export const letteringOf = (
	drawing: Drawing,
	layers: readonly ShapeLayer[] = shapeLayers,
): string => {
	const shapes = drawing.shapes.filter(({ layer }) => layers.includes(layer));
	return paintSvg({ ...drawing, fills: [], lines: [], shapes }, { fills: 'attribute', idPrefix });
};

/** Groups that stay: regions are changed one by one, borders never. */
const standing = new Set([`${idPrefix}fills`, `${idPrefix}borders`]);

/**
 * Labels take the ink that reads on their fill, the legend lists the inks in use, hatches follow the inks.
 * `before`: the lettering that stands, which is left alone when it is the same. Answers the lettering that
 * stands now.
 */
export function setLettering(
	svg: SVGSVGElement,
	drawing: Drawing,
	before: string,
	layers: readonly ShapeLayer[] = shapeLayers,
): string {
	const lettering = letteringOf(drawing, layers);
	if (lettering === before) return before;
	const groups = groupsOf(parseSvg(lettering));
	const stay = new Map(groupsOf(svg).map((group) => [group.id, group]));
	for (const [id, group] of stay) if (!standing.has(id)) group.remove();
	let place: Element | null = null;
	for (const group of groups.reverse()) {
		const own = standing.has(group.id) ? stay.get(group.id) : undefined;
		const next = own ?? document.importNode(group, true);
		if (!own) svg.insertBefore(next, place);
		place = next;
	}
	return lettering;
}

const groupsOf = (svg: SVGSVGElement): Element[] =>
	[...svg.children].filter(({ localName }) => localName === 'g');
