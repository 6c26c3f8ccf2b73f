declare module 'polylabel' {
	/** Pole of inaccessibility of a polygon: outer ring first, then holes; x, y and distance to the edge. */
	export default function polylabel(
		polygon: [number, number][][],
		precision?: number,
	): number[] & { distance: number };
}
