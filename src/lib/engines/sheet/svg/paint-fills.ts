import type { Drawing, RegionFill } from '../drawing.ts';
import { elementId } from './element-id.ts';
import { escapeXml } from './escape.ts';
import { ringsPath } from './path-data.ts';
import type { SvgOptions } from './paint-svg.ts';

/** Name, ink and lock in words, as a screen reader says them. */
export function fillWords({ name, key, ink, locked }: RegionFill, drawing: Drawing): string {
	const which = name || key;
	if (ink < 0) return `${which}, no ink yet`;
	const inkName = drawing.inks[ink]?.name ?? 'not in the palette';
	return `${which}, ink ${ink + 1}${inkName ? ` ${inkName}` : ''}${locked ? ', locked' : ''}`;
}

/** One path a region, in region order; a region too small to draw keeps an empty one. */
export function paintFills(drawing: Drawing, options: SvgOptions): string[] {
	const focus = options.interactive ? ' tabindex="-1"' : '';
	return drawing.fills.map((fill) => {
		const words = escapeXml(fillWords(fill, drawing));
		const colour = options.fills === 'class' ? `class="ink-${fill.ink + 1}"` : `fill="${fill.hex}"`;
		const lock = fill.locked ? ' data-locked="true"' : '';
		const path = ringsPath(drawing, fill.rings);
		return `<path id="${escapeXml(elementId(fill.key, options.idPrefix))}" data-key="${escapeXml(fill.key)}" data-ink="${fill.ink + 1}"${lock} ${colour} role="graphics-symbol" aria-label="${words}"${focus} d="${path}"><title>${words}</title></path>`;
	});
}
