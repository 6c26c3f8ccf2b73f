import type { DrawnText } from '../../sheet/index.ts';
import type { Glyph, Letters } from './glyph-paths.ts';

const names = { moveTo: 'M', lineTo: 'L', quadraticCurveTo: 'Q', bezierCurveTo: 'C' } as const;

/** A number of path data: thousandths of a millimetre are finer than any press. */
const short = (value: number): string => String(Math.round(value * 10) / 10 || 0);

/** A text's letters as SVG path data in the sheet's units, standing where the text would. */
export function outlineText(
	{ face, size, text, x, y, spacing = 0 }: DrawnText,
	letters: Letters,
): string {
	let path = '';
	let left = x;
	for (const character of text) {
		const glyph = letters(face, character);
		path += outlineAt(glyph, left, y, size / 1000);
		left += (glyph.advance * size) / 1000 + spacing;
	}
	return path;
}

function outlineAt({ steps }: Glyph, x: number, y: number, scale: number): string {
	return steps
		.map(({ command, args }) => {
			if (command === 'closePath') return 'Z';
			const numbers = args.map((value, i) => short(i % 2 ? y - value * scale : x + value * scale));
			return `${names[command]}${numbers.join(' ')}`;
		})
		.join('');
}
