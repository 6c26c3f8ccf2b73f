import { caution, type SheetLayout } from '../layout.ts';
import { cleanText } from '../type/clean-text.ts';
import { setBlock, type Block } from './heading.ts';

/** Small print on A4: 6.5 point. */
const smallPrint = 229;

export const smallSize = (scale: number): number => Math.round(smallPrint * scale);

/**
 * The lines at the sheet's foot, standing on the bottom edge `y`: caution, credits and projection on
 * the left, the issue on the right. The caution is always whole.
 */
export function foot(
	layout: Pick<SheetLayout, 'credits'>,
	projection: string,
	issue: string,
	scale: number,
	x: number,
	y: number,
	width: number,
): Block {
	const style = { face: 'sans', size: smallSize(scale), layer: 'collar', leading: 1.3 } as const;
	const right = setBlock(cleanText(issue), { ...style, most: 2 }, 0, 0, width * 0.3);
	const rightWidth = Math.max(0, ...right.texts.map((text) => text.width));
	const column = width - (rightWidth ? rightWidth + style.size * 2 : 0);
	const credits = setBlock(cleanText(layout.credits), { ...style, most: 3 }, x, 0, column);
	const legal = setBlock(`${caution} ${projection}`, { ...style, most: 99 }, x, 0, column);
	const gap = credits.height ? Math.round(style.size * 0.3) : 0;
	const height = Math.max(credits.height + gap + legal.height, right.height);
	const down = (block: Block, bottom: number) =>
		block.texts.map((text) => ({ ...text, y: text.y + bottom - block.height }));
	const issued = down(right, y).map((text) => ({ ...text, x: Math.floor(x + width - text.width) }));
	return {
		texts: [...down(credits, y - legal.height - gap), ...down(legal, y), ...issued],
		height,
	};
}
