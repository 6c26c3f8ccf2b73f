import type { LineLayer } from './drawing.ts';
import type { Leader } from './labels/leader.ts';
import type { SheetArcs } from './plane/quantise.ts';

/** Width on A4: a hairline, finer than any border. */
const width = 10;

/** The arcs of a sheet with one more of two points for every leader. */
export function withLeaders({ arcPoints, arcStarts }: SheetArcs, leaders: Leader[]): SheetArcs {
	if (!leaders.length) return { arcPoints, arcStarts };
	const end = arcPoints.length / 2;
	const points = new Int32Array(arcPoints.length + 4 * leaders.length);
	const starts = new Uint32Array(arcStarts.length + leaders.length);
	points.set(arcPoints);
	starts.set(arcStarts);
	leaders.forEach(({ from, to }, i) => {
		points.set([from.x, from.y, to.x, to.y], arcPoints.length + 4 * i);
		starts[arcStarts.length + i] = end + 2 * (i + 1);
	});
	return { arcPoints: points, arcStarts: starts };
}

/** The layer that draws them; `arcs` are those of the sheet without leaders. */
export function leaderLayer(arcs: SheetArcs, leaders: Leader[], scale: number): LineLayer[] {
	if (!leaders.length) return [];
	const first = arcs.arcStarts.length - 1;
	return [
		{
			rank: 'leader',
			width: Math.max(5, Math.round(width * scale)),
			hex: '#000000',
			arcs: Uint32Array.from(leaders, (_, i) => first + i),
		},
	];
}
