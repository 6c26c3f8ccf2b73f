/** A drawing's geometry as path operators of ISO 32000-1, 8.5: whole hundredths of a millimetre, y down. */
import type { Drawing, DrawnShape } from '../../sheet/index.ts';

type Arcs = Pick<Drawing, 'arcPoints' | 'arcStarts'>;

/**
 * Where numbers are counted from: near places have short ones, which makes a large sheet's file a third
 * smaller and sooner packed. Whole steps, so nothing is lost.
 */
interface Origin {
	x: number;
	y: number;
}

/** The points of one arc as lines, walked either way; the first is left out unless a path begins. */
function walk(arcs: Arcs, signed: number, begins: boolean, { x, y }: Origin): string {
	const { arcPoints: p, arcStarts } = arcs;
	const back = signed < 0;
	const arc = back ? ~signed : signed;
	const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
	const way = back ? -1 : 1;
	let at = back ? last : first;
	let text = begins ? `${p[2 * at] - x} ${p[2 * at + 1] - y} m\n` : '';
	for (let left = last - first; left > 0; left--) {
		at += way;
		text += `${p[2 * at] - x} ${p[2 * at + 1] - y} l\n`;
	}
	return text;
}

function startOf({ arcPoints: p, arcStarts }: Arcs, signed: number): Origin {
	const at = signed < 0 ? arcStarts[~signed + 1] - 1 : arcStarts[signed];
	return { x: p[2 * at], y: p[2 * at + 1] };
}

const moved = ({ x, y }: Origin): string => `1 0 0 1 ${x} ${y} cm\n`;

/** Rings filled by the rule of winding numbers, counted from where the first begins. */
export function ringsOperators(arcs: Arcs, rings: Int32Array[]): string {
	const origin = startOf(arcs, rings[0][0]);
	let text = `q ${moved(origin)}`;
	for (const ring of rings) {
		ring.forEach((signed, i) => (text += walk(arcs, signed, i === 0, origin)));
		text += 'h\n';
	}
	return `${text}f Q`;
}

/** Arcs as open lines, each stroked by itself; a closed one is closed: its corner is joined, not capped. */
export function linesOperators(arcs: Arcs, list: ArrayLike<number>): string {
	const { arcPoints: p, arcStarts } = arcs;
	let text = '';
	let from: Origin = { x: 0, y: 0 };
	for (let i = 0; i < list.length; i++) {
		const [first, last] = [arcStarts[list[i]], arcStarts[list[i] + 1] - 1];
		if (last <= first) continue;
		const origin = startOf(arcs, list[i]);
		text += moved({ x: origin.x - from.x, y: origin.y - from.y });
		text += walk(arcs, list[i], true, origin);
		const closed = p[2 * first] === p[2 * last] && p[2 * first + 1] === p[2 * last + 1];
		text += closed ? 's\n' : 'S\n';
		from = origin;
	}
	return text;
}

/** Lines of several arcs, each one path, so that dashes run on from arc to arc; closed where it comes back. */
export function chainsOperators(arcs: Arcs, chains: readonly Int32Array[]): string {
	let text = '';
	for (const chain of chains) {
		const path = Array.from(chain, (signed, i) => walk(arcs, signed, i === 0, nowhere)).join('');
		const [from, to] = [startOf(arcs, chain[0]), startOf(arcs, ~chain[chain.length - 1])];
		text += `${path}${from.x === to.x && from.y === to.y ? 's' : 'S'}\n`;
	}
	return text;
}

const nowhere: Origin = { x: 0, y: 0 };

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
