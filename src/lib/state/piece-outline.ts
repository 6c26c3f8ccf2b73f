import type { Drawing } from '$lib/engines/sheet/drawing';
import { ringDoubleArea, ringPoints } from '../engines/sheet/fills.ts';

/**
 * Path data round one piece of a region on the drawn sheet. Rings of parts run one way and their holes
 * the other; where the drawing has a ring for every part the piece is the part of that number, else, small
 * ones having vanished on the paper, the one of that rank by area. '' where it is too small to be drawn.
 */
export function pieceOutline(
	drawing: Pick<Drawing, 'fills' | 'arcPoints' | 'arcStarts'>,
	piece: { region: number; part: number; rank: number },
	parts: number,
): string {
	const fill = drawing.fills.find(({ region }) => region === piece.region);
	const rings = (fill?.rings ?? []).map((ring) => {
		const points = ringPoints(drawing, ring);
		return { points, area: ringDoubleArea(points) };
	});
	const bySize = [...rings].sort((p, q) => Math.abs(q.area) - Math.abs(p.area));
	const way = Math.sign(bySize[0]?.area ?? 0);
	const outer = (list: typeof rings) => list.filter(({ area }) => Math.sign(area) === way);
	const found =
		outer(rings).length === parts ? outer(rings)[piece.part] : outer(bySize)[piece.rank - 1];
	return found ? pathOf(found.points) : '';
}

function pathOf(points: readonly number[]): string {
	let path = '';
	for (let i = 0; i < points.length; i += 2)
		path += `${i ? 'L' : 'M'}${points[i]} ${points[i + 1]}`;
	return `${path}Z`;
}
