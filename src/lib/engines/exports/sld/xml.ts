import { escapeXml } from '../../sheet/svg/escape.ts';

/** An element with what stands in it: finished elements, or text that `text` made safe. */
export function element(
	name: string,
	attributes: Record<string, string>,
	content: string[],
): string {
	const said = Object.entries(attributes).map(([key, value]) => ` ${key}="${escapeXml(value)}"`);
	const inside = content.filter((one) => one !== '').join('');
	return inside ? `<${name}${said.join('')}>${inside}</${name}>` : `<${name}${said.join('')}/>`;
}

export const text = escapeXml;

/** `SvgParameter` of Symbology Encoding 1.1.0, 11.1.3. */
export const parameter = (name: string, value: string): string =>
	element('se:SvgParameter', { name }, [text(value)]);

/** Millimetres as pixels of 0.28 mm, the size that the standard reckons a pixel (10.2). */
export const pixels = (mm: number): string => String(Math.round((mm / 0.28) * 1000) / 1000);
