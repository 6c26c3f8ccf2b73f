import type { Hatch } from '$lib/engines/palettes/palette';

/** About the size of a millimetre on paper at 96 pixels an inch. */
const pixelsPerMm = 96 / 25.4;

/** Lines of a hatch across a square of `size` pixels, cut at its edge, as the `d` of a path. */
export function hatchPath({ kind, angle, spacingMm }: Hatch, size: number): string {
	const step = Math.max(2, Math.min(spacingMm * pixelsPerMm, size / 2.5));
	const across = linesAt(angle, step, size);
	return kind === 'crossed' ? across + linesAt(angle + 90, step, size) : across;
}

/** Width of the lines in pixels: as on paper, but never too thin to be seen or so thick that they meet. */
export const hatchWidth = ({ widthMm }: Hatch): number =>
	Math.min(3, Math.max(0.75, widthMm * pixelsPerMm));

function linesAt(angle: number, step: number, size: number): string {
	const turn = (angle * Math.PI) / 180;
	// anticlockwise against the horizontal, where y points down
	const along = [Math.cos(turn), -Math.sin(turn)];
	const normal = [Math.sin(turn), Math.cos(turn)];
	const middle = size / 2;
	let path = '';
	for (let k = -Math.ceil(size / step); k <= Math.ceil(size / step); k++) {
		const start = [middle + k * step * normal[0], middle + k * step * normal[1]];
		const cut = withinSquare(start, along, size);
		if (cut) path += `M${cut[0].join(' ')}L${cut[1].join(' ')}`;
	}
	return path;
}

/** The piece of a line inside the square from 1 to size - 1; null where it misses it. */
function withinSquare(start: number[], along: number[], size: number): string[][] | null {
	let [from, to] = [-Infinity, Infinity];
	for (const axis of [0, 1]) {
		const [low, high] = [1 - start[axis], size - 1 - start[axis]];
		if (Math.abs(along[axis]) < 1e-9) {
			if (low > 0 || high < 0) return null;
			continue;
		}
		const ends = [low / along[axis], high / along[axis]].sort((a, b) => a - b);
		[from, to] = [Math.max(from, ends[0]), Math.min(to, ends[1])];
	}
	if (from >= to) return null;
	return [from, to].map((t) => start.map((at, axis) => (at + t * along[axis]).toFixed(1)));
}
