/** A drawing's geometry as path operators of ISO 32000-1, 8.5: whole hundredths of a millimetre, y down. */
import type { Drawing, DrawnShape } from '../../sheet/index.ts';

type Arcs = Pick<Drawing, 'arcPoints' | 'arcStarts'>;

/** The points of one arc as lines, walked either way; the first is left out unless a path begins. */
function walk({ arcPoints: p, arcStarts }: Arcs, signed: number, begins: boolean): string {
	const back = signed < 0;
	const arc = back ? ~signed : signed;
	const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
	const way = back ? -1 : 1;
	let at = back ? last : first;
	let text = begins ? `${p[2 * at]} ${p[2 * at + 1]} m\n` : '';
	for (let left = last - first; left > 0; left--) {
		at += way;
		text += `${p[2 * at]} ${p[2 * at + 1]} l\n`;
	}
	return text;
}

export function ringsOperators(arcs: Arcs, rings: Int32Array[]): string {
	let text = '';
	for (const ring of rings) {
		ring.forEach((signed, i) => (text += walk(arcs, signed, i === 0)));
		text += 'h\n';
	}
	return text;
}

/** Arcs as open lines; a closed one is closed, so that its corner is joined and not capped. */
export function linesOperators(arcs: Arcs, list: ArrayLike<number>): string {
	const { arcPoints: p, arcStarts } = arcs;
	let text = '';
	for (let i = 0; i < list.length; i++) {
		const [first, last] = [arcStarts[list[i]], arcStarts[list[i] + 1] - 1];
		if (last <= first) continue;
		text += walk(arcs, list[i], true);
		if (p[2 * first] === p[2 * last] && p[2 * first + 1] === p[2 * last + 1]) text += 'h\n';
	}
	return text;
}

export function shapeOperators({ points, starts, closed }: DrawnShape): string {
	let text = '';
	for (let path = 0; path + 1 < starts.length; path++) {
		for (let at = starts[path]; at < starts[path + 1]; at++) {
			const operator = at === starts[path] ? 'm' : 'l';
			text += `${points[2 * at]} ${points[2 * at + 1]} ${operator}\n`;
		}
		if (closed && starts[path + 1] > starts[path]) text += 'h\n';
	}
	return text;
}
