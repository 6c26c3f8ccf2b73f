/**
 * Hatch lines cut at the outline of an area, as segments. Real segments and not a tiling pattern, because
 * every painter would set a pattern's phase otherwise. By scan lines in a frame that is turned with the
 * lines, even and odd.
 */

export interface LineFamily {
	/** degrees against the horizontal, anticlockwise on the paper */
	angle: number;
	/** from one line to the next, hundredths of a millimetre */
	spacing: number;
	/** how far the first line lies from the paper's upper left corner; lines of one phase run on from area to area */
	phase?: number;
}

/** Most lines across one area; above that they are left out rather than drawn as a solid. */
const mostLines = 20_000;

/**
 * In: closed rings, x and y interleaved, the first point not repeated, in hundredths of a millimetre. Out: the
 * parts of all lines that lie inside by the even-odd rule: x1, y1, x2, y2 of each in turn, whole hundredths;
 * parts shorter than that are left out. Time: the edges, and the crossings sorted line by line.
 */
export function cutLines(rings: readonly ArrayLike<number>[], family: LineFamily): number[] {
	const radians = (family.angle * Math.PI) / 180;
	const turned = { cos: Math.cos(radians), sin: Math.sin(radians) };
	const found = crossings(rings, family, turned);
	const segments: number[] = [];
	for (const { line, along } of found) {
		along.sort((a, b) => a - b);
		for (let i = 0; i + 1 < along.length; i += 2) {
			const [x1, y1] = onPaper(along[i], line, turned);
			const [x2, y2] = onPaper(along[i + 1], line, turned);
			if (x1 !== x2 || y1 !== y2) segments.push(x1, y1, x2, y2);
		}
	}
	return segments;
}

interface Turn {
	cos: number;
	sin: number;
}

/** y runs down the paper, so an anticlockwise angle turns the lines' direction to (cos, -sin). */
const onPaper = (along: number, across: number, { cos, sin }: Turn): [number, number] => [
	Math.round(along * cos + across * sin),
	Math.round(across * cos - along * sin),
];

function crossings(
	rings: readonly ArrayLike<number>[],
	{ spacing, phase = 0 }: LineFamily,
	{ cos, sin }: Turn,
): { line: number; along: number[] }[] {
	const byLine = new Map<number, number[]>();
	for (const ring of rings) {
		const last = ring.length - 2;
		if (last < 4) continue;
		let u0 = ring[last] * cos - ring[last + 1] * sin;
		let v0 = ring[last] * sin + ring[last + 1] * cos;
		for (let i = 0; i <= last; i += 2) {
			const u1 = ring[i] * cos - ring[i + 1] * sin;
			const v1 = ring[i] * sin + ring[i + 1] * cos;
			const [low, high] = v0 < v1 ? [v0, v1] : [v1, v0];
			// half open, so that a line through a corner crosses once or not at all
			const first = Math.ceil((low - phase) / spacing);
			const end = Math.ceil((high - phase) / spacing);
			for (let k = first; k < end && k < first + mostLines; k++) {
				const at = u0 + ((u1 - u0) * (k * spacing + phase - v0)) / (v1 - v0);
				const list = byLine.get(k);
				if (list) list.push(at);
				else byLine.set(k, [at]);
			}
			[u0, v0] = [u1, v1];
		}
	}
	const lines = [...byLine.keys()].sort((a, b) => a - b);
	return lines.map((k) => ({ line: k * spacing + phase, along: byLine.get(k)! }));
}
