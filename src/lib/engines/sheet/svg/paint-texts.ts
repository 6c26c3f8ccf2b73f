import type { DrawnText, Drawing } from '../drawing.ts';
import { faceStyles } from '../type/face.ts';
import { isSetIn } from '../type/text-width.ts';
import { escapeXml } from './escape.ts';
import type { SvgOptions } from './paint-svg.ts';

/** Width of a halo in parts of the type size, on each side of the letter. */
export const haloShare = 0.11;

/**
 * Texts of some layers, halos first as elements of their own: the order of painting within one element
 * is lost in some converters. Those of names are painted by `paintHalos`.
 */
export function paintTexts(
	{ texts }: Drawing,
	layers: DrawnText['layer'][],
	options: SvgOptions,
): string[] {
	const chosen = texts.filter(({ layer }) => layers.includes(layer));
	const around = chosen.filter(({ layer }) => layer !== 'label');
	const letters = chosen.map((text) => element(text, `fill="${text.hex}"`, options));
	return [...halosOf(around, options), ...letters].filter((one) => one !== '');
}

/** Halos of the names, which lie under the border lines: those stay whole. */
export const paintHalos = ({ texts }: Drawing, options: SvgOptions): string[] =>
	halosOf(
		texts.filter(({ layer }) => layer === 'label'),
		options,
	).filter((one) => one !== '');

const halosOf = (texts: DrawnText[], options: SvgOptions): string[] =>
	texts
		.filter((text) => text.halo)
		.map((text) =>
			element(
				text,
				`fill="none" stroke="${text.halo}" stroke-width="${Math.round(text.size * haloShare * 2)}" stroke-linejoin="round" aria-hidden="true"`,
				options,
			),
		);

function element(text: DrawnText, paint: string, options: SvgOptions): string {
	const { fills, outline } = options;
	if (outline) return outlined(text, paint, outline(text));
	const { family, fallback, weight, italic } = faceStyles[text.face];
	// without a style block kerning cannot be switched off, so the width is held by this attribute
	const held = !text.spacing && (fills === 'attribute' || !isSetIn(text.face, text.text));
	const set =
		fills === 'class'
			? `class="${text.face}"`
			: `font-family="'${family}','${family} Variable',${fallback}" font-weight="${weight}"${italic ? ' font-style="italic"' : ''}`;
	const length = held && text.width > 0 ? ` textLength="${text.width}"` : '';
	const apart = text.spacing ? ` letter-spacing="${text.spacing}"` : '';
	return `<text ${set}${apart} x="${text.x}" y="${text.y}" font-size="${text.size}"${length} ${paint}>${escapeXml(text.text)}</text>`;
}

/** Letters drawn as a path: what they say stands in its label. */
function outlined({ text }: DrawnText, paint: string, path: string): string {
	if (path === '') return '';
	const words = paint.includes('aria-hidden') ? '' : ` role="img" aria-label="${escapeXml(text)}"`;
	return `<path${words} ${paint} d="${path}"/>`;
}
