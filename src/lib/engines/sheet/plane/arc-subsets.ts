import type { Coverage } from '../../boundaries/coverage.ts';
import type { SheetArcs } from './quantise.ts';

export type LonLatArcs = Pick<Coverage, 'arcPoints' | 'arcStarts'>;

/** Some arcs by themselves, in the order given. */
export function onlyArcs(
	{ arcPoints, arcStarts }: LonLatArcs,
	arcs: ArrayLike<number>,
): LonLatArcs {
	const starts = new Uint32Array(arcs.length + 1);
	for (let i = 0; i < arcs.length; i++)
		starts[i + 1] = starts[i] + arcStarts[arcs[i] + 1] - arcStarts[arcs[i]];
	const points = new Float64Array(2 * starts[arcs.length]);
	for (let i = 0; i < arcs.length; i++) {
		const [from, to] = [arcStarts[arcs[i]], arcStarts[arcs[i] + 1]];
		points.set(arcPoints.subarray(2 * from, 2 * to), 2 * starts[i]);
	}
	return { arcPoints: points, arcStarts: starts };
}

/** Arcs laid in the place of others. In: for each patch the arcs' numbers, and their points in that order. */
export function withArcs(
	{ arcPoints, arcStarts }: SheetArcs,
	patches: { arcs: ArrayLike<number>; points: SheetArcs }[],
): SheetArcs {
	const count = arcStarts.length - 1;
	const source: Int32Array[] = Array.from({ length: count }, (_, arc) =>
		arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc + 1]),
	);
	for (const { arcs, points } of patches) {
		for (let i = 0; i < arcs.length; i++) {
			const [from, to] = [points.arcStarts[i], points.arcStarts[i + 1]];
			source[arcs[i]] = points.arcPoints.subarray(2 * from, 2 * to);
		}
	}
	const starts = new Uint32Array(count + 1);
	source.forEach((own, arc) => (starts[arc + 1] = starts[arc] + own.length / 2));
	const all = new Int32Array(2 * starts[count]);
	source.forEach((own, arc) => all.set(own, 2 * starts[arc]));
	return { arcPoints: all, arcStarts: starts };
}

/** Arcs and rings of some parts, as the extent of them is measured; arcs numbered anew. */
export function partsOnly(
	coverage: Coverage,
	parts: Iterable<number>,
): Pick<Coverage, 'arcPoints' | 'arcStarts' | 'ringArcs' | 'ringStarts'> & { arcs: number[] } {
	const { partRings, ringStarts, ringArcs } = coverage;
	const place = new Map<number, number>();
	const signed: number[] = [];
	const starts = [0];
	for (const part of parts) {
		for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
			for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
				const arc = ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i];
				if (!place.has(arc)) place.set(arc, place.size);
				signed.push(ringArcs[i] < 0 ? ~place.get(arc)! : place.get(arc)!);
			}
			starts.push(signed.length);
		}
	}
	const arcs = [...place.keys()];
	return {
		...onlyArcs(coverage, arcs),
		...{ ringArcs: Int32Array.from(signed), ringStarts: Uint32Array.from(starts), arcs },
	};
}
