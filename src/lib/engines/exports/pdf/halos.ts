import type { DrawnText } from '../../sheet/index.ts';
import { haloShare } from '../../sheet/svg/paint-texts.ts';
import type { Glyph, Letters } from '../letters/glyph-paths.ts';
import { decimal, rgb } from './numbers.ts';

/**
 * The halo of a text as outlines of its letters, each in a space of its own, so that equal letters are
 * equal bytes. Not as text: a name would then be found, copied and read aloud twice.
 */
export function haloOperators(
	text: DrawnText,
	letters: Letters,
	known: Map<Glyph, string>,
): string {
	const scale = text.size / 1000;
	const width = (2 * haloShare * 1000).toFixed(0);
	const parts = [`${rgb(text.halo!)} RG ${width} w 1 j`];
	let x = text.x;
	for (const character of text.text) {
		const glyph = letters(text.face, character);
		let path = known.get(glyph);
		if (path === undefined) known.set(glyph, (path = outline(glyph)));
		if (path) {
			parts.push(
				`q ${decimal(scale)} 0 0 ${decimal(-scale)} ${decimal(x)} ${text.y} cm\n${path}S Q`,
			);
		}
		x += glyph.advance * scale + (text.spacing ?? 0);
	}
	return parts.length > 1 ? parts.join('\n') : '';
}

/** Quadratic curves are raised to cubic ones, the only kind there is (ISO 32000-1, 8.5.2.2). */
function outline({ steps }: Glyph): string {
	let text = '';
	let [x, y] = [0, 0];
	const say = (values: number[], operator: string) =>
		(text += `${values.map((value) => decimal(value)).join(' ')} ${operator}\n`);
	for (const { command, args } of steps) {
		if (command === 'closePath') {
			text += 'h\n';
			continue;
		}
		if (command === 'moveTo') say(args, 'm');
		else if (command === 'lineTo') say(args, 'l');
		else if (command === 'bezierCurveTo') say(args, 'c');
		else {
			const [cx, cy, ex, ey] = args;
			const [first, second] = [raised(x, cx), raised(y, cy)];
			say([first, second, raised(ex, cx), raised(ey, cy), ex, ey], 'c');
		}
		[x, y] = args.slice(-2);
	}
	return text;
}

const raised = (end: number, control: number): number => end + (2 / 3) * (control - end);
