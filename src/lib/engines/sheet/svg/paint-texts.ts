import type { DrawnText, Drawing } from '../drawing.ts';
import { faceStyles } from '../type/face.ts';
import { isSetIn } from '../type/text-width.ts';
import { escapeXml } from './escape.ts';
import type { SvgOptions } from './paint-svg.ts';

/** Width of a halo in parts of the type size, on each side of the letter. */
const halo = 0.11;

/** Texts of some layers, without their halos. */
export function paintTexts(
	{ texts }: Drawing,
	layers: DrawnText['layer'][],
	options: SvgOptions,
): string[] {
	return texts
		.filter(({ layer }) => layers.includes(layer))
		.map((text) => element(text, `fill="${text.hex}"`, options));
}

/**
 * Halos of the names, elements of their own: the order of painting within one element is lost in some
 * converters, and they lie under the border lines, which must stay whole.
 */
export function paintHalos({ texts }: Drawing, options: SvgOptions): string[] {
	return texts.flatMap((text) => {
		if (text.layer !== 'label' || !text.halo) return [];
		const width = Math.round(text.size * halo * 2);
		const stroke = `fill="none" stroke="${text.halo}" stroke-width="${width}"`;
		return element(text, `${stroke} stroke-linejoin="round"`, options);
	});
}

function element(text: DrawnText, paint: string, { fills }: SvgOptions): string {
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
