import { paintSvg } from '$lib/engines/sheet';
import type { Drawing } from '$lib/engines/sheet/drawing';

/** Put before the ids of the sheet's elements, which share the page with others. */
export const idPrefix = 'sheet-';

export function parseSvg(text: string): SVGSVGElement {
	const root = new DOMParser().parseFromString(text, 'image/svg+xml').documentElement;
	if (root.localName !== 'svg') throw new Error('the sheet could not be read as SVG');
	return root as unknown as SVGSVGElement;
}

/** A drawing without fills and lines: names, legend and collar. */
export const letteringOf = (drawing: Drawing): string =>
	paintSvg({ ...drawing, fills: [], lines: [] }, { fills: 'attribute', idPrefix });

/**
 * Labels take the ink that reads on their fill, the legend lists the inks in use. `before`: the lettering
 * that stands, which is left alone when it is the same. Answers the lettering that stands now.
 */
export function setLettering(svg: SVGSVGElement, drawing: Drawing, before: string): string {
	const lettering = letteringOf(drawing);
	if (lettering === before) return before;
	const fresh = parseSvg(lettering);
	for (const name of ['labels', 'collar']) {
		const now = svg.querySelector(`#${idPrefix}${name}`);
		const next = fresh.querySelector(`#${idPrefix}${name}`);
		if (now && next) now.replaceWith(document.importNode(next, true));
	}
	return lettering;
}
