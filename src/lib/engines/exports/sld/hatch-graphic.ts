import type { Hatch } from '../../palettes/palette.ts';
import { base64 } from '../base64.ts';
import { element as el, pixels } from './xml.ts';

/**
 * A hatch as graphic fills (Symbology Encoding 1.1.0, 11.2.2 and 11.3.2): for each direction of lines a
 * tile that repeats without a seam, as an SVG carried in base 64.
 */
export function hatchSymbolizers(hatch: Hatch): string[] {
	const angles = hatch.kind === 'crossed' ? [hatch.angle, (hatch.angle + 90) % 180] : [hatch.angle];
	return angles.map((angle) => {
		const { svg, heightMm } = hatchTile({ ...hatch, angle });
		const graphic = el('se:ExternalGraphic', {}, [
			el('se:InlineContent', { encoding: 'base64' }, [base64(new TextEncoder().encode(svg))]),
			el('se:Format', {}, ['image/svg+xml']),
		]);
		const size = el('se:Size', {}, [pixels(heightMm)]);
		return el('se:PolygonSymbolizer', { version: '1.1.0' }, [
			el('se:Fill', {}, [el('se:GraphicFill', {}, [el('se:Graphic', {}, [graphic, size])])]),
		]);
	});
}

/** Lines that lean less than this against an edge of the tile are drawn along it: the tile would be huge. */
const leastLean = 3;

/**
 * The smallest rectangle after which slanting lines repeat: spacing by sine wide, spacing by cosine high,
 * one line from corner to corner, and its neighbours for the corners they cut.
 */
export function hatchTile({ angle, spacingMm, widthMm, hex }: Hatch): {
	svg: string;
	heightMm: number;
} {
	const lean = Math.min(angle % 90, 90 - (angle % 90));
	const [flat, upright] = [
		lean < leastLean && (angle < 45 || angle > 135),
		lean < leastLean && angle >= 45 && angle <= 135,
	];
	const radians = (angle * Math.PI) / 180;
	const width = flat || upright ? spacingMm : spacingMm / Math.abs(Math.sin(radians));
	const height = flat || upright ? spacingMm : spacingMm / Math.abs(Math.cos(radians));
	const [w, h] = [width, height].map(short);
	const path = flat
		? `M0 ${short(height / 2)}H${w}`
		: upright
			? `M${short(width / 2)} 0V${h}`
			: [-1, 0, 1].map((turn) => slanting(turn * width, width, height, angle < 90)).join('');
	const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${w}mm" height="${h}mm" viewBox="0 0 ${w} ${h}"><path d="${path}" fill="none" stroke="${hex}" stroke-width="${widthMm}" stroke-linecap="square"/></svg>`;
	return { svg, heightMm: Math.round(height * 1e4) / 1e4 };
}

/** Rising to the right for angles under 90 degrees; paper counts downwards. */
const slanting = (from: number, width: number, height: number, rising: boolean): string =>
	rising
		? `M${short(from)} ${short(height)}L${short(from + width)} 0`
		: `M${short(from)} 0L${short(from + width)} ${short(height)}`;

const short = (value: number): string => String(Math.round(value * 1e4) / 1e4);
