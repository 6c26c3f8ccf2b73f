import type { Drawing } from '../drawing.ts';
import type { DrawnShape } from '../shapes.ts';

type Arcs = Pick<Drawing, 'arcPoints' | 'arcStarts'>;

/** Two whole numbers with as few characters as path data allows: a minus sign parts them. */
const pair = (x: number, y: number): string => (y < 0 ? `${x}${y}` : `${x} ${y}`);

/** Steps from point to point of an arc, walked either way, without its first point. */
function steps({ arcPoints, arcStarts }: Arcs, signed: number): string {
	const arc = signed < 0 ? ~signed : signed;
	const [start, end] = [arcStarts[arc], arcStarts[arc + 1]];
	const way = signed < 0 ? -1 : 1;
	let at = signed < 0 ? end - 1 : start;
	let text = '';
	for (let left = end - start - 1; left > 0; left--) {
		const next = at + way;
		const dx = arcPoints[2 * next] - arcPoints[2 * at];
		const dy = arcPoints[2 * next + 1] - arcPoints[2 * at + 1];
		text += text && dx >= 0 ? ` ${pair(dx, dy)}` : pair(dx, dy);
		at = next;
	}
	return text;
}

function startOf({ arcPoints, arcStarts }: Arcs, signed: number): string {
	const point = signed < 0 ? arcStarts[~signed + 1] - 1 : arcStarts[signed];
	return pair(arcPoints[2 * point], arcPoints[2 * point + 1]);
}

/**
 * Closed rings as path data, each a moveto and relative linetos. Arcs that shrank to one point add
 * nothing: a lineto without numbers would end the path there (SVG 2, section 9.5.4).
 */
export function ringsPath(arcs: Arcs, rings: Int32Array[]): string {
	return rings
		.map((ring) => {
			const parts = Array.from(ring, (signed) => steps(arcs, signed)).filter((text) => text !== '');
			return `M${startOf(arcs, ring[0])}l${joined(parts)}z`;
		})
		.join('');
}

function joined(parts: string[]): string {
	return parts.reduce(
		(all, part) => (all && !part.startsWith('-') ? `${all} ${part}` : all + part),
		'',
	);
}

/** Arcs as open lines; a closed arc ends with `z`, so that its corner is joined and not capped. */
export function linesPath(arcs: Arcs, list: Uint32Array): string {
	let text = '';
	for (const arc of list) {
		const line = steps(arcs, arc);
		if (line !== '') text += `M${startOf(arcs, arc)}l${line}${isClosed(arcs, arc) ? 'z' : ''}`;
	}
	return text;
}

/** Lines of several arcs, each one subpath, so that dashes run on from arc to arc. */
export function chainsPath(arcs: Arcs, chains: readonly Int32Array[]): string {
	return chains
		.map((chain) => {
			const parts = Array.from(chain, (signed) => steps(arcs, signed)).filter(
				(text) => text !== '',
			);
			if (parts.length === 0) return '';
			const ends = startOf(arcs, ~chain[chain.length - 1]) === startOf(arcs, chain[0]);
			return `M${startOf(arcs, chain[0])}l${joined(parts)}${ends ? 'z' : ''}`;
		})
		.join('');
}

function isClosed({ arcPoints, arcStarts }: Arcs, arc: number): boolean {
	const [first, last] = [arcStarts[arc], arcStarts[arc + 1] - 1];
	return (
		arcPoints[2 * first] === arcPoints[2 * last] &&
		arcPoints[2 * first + 1] === arcPoints[2 * last + 1]
	);
}

/**
 * Paths of a shape, each a relative moveto and relative linetos, closed where the shape is. Paths of a
 * single point paint nothing and are left out.
 */
export function shapePath({
	points,
	starts,
	closed,
}: Pick<DrawnShape, 'points' | 'starts' | 'closed'>): string {
	const parts: string[] = [];
	let [penX, penY] = [0, 0];
	for (let path = 0; path + 1 < starts.length; path++) {
		const [first, last] = [starts[path], starts[path + 1] - 1];
		if (last <= first) continue;
		const [x, y] = [points[2 * first], points[2 * first + 1]];
		parts.push(parts.length ? `m${pair(x - penX, y - penY)}l` : `M${pair(x, y)}l`);
		for (let i = first + 1; i <= last; i++) {
			const step = pair(points[2 * i] - points[2 * i - 2], points[2 * i + 1] - points[2 * i - 1]);
			parts.push(i > first + 1 && !step.startsWith('-') ? ` ${step}` : step);
		}
		if (closed) parts.push('z');
		// after `z` the pen stands where the path began (SVG 2, section 9.3.4)
		const end = closed ? first : last;
		[penX, penY] = [points[2 * end], points[2 * end + 1]];
	}
	return parts.join('');
}
