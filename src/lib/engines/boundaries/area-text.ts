/** An area for a sentence: whole square kilometres, two digits of less, square metres when it is small. */
export function areaText(km2: number): string {
	if (km2 >= 10) return `${Math.round(km2)} km²`;
	if (km2 >= 0.01) return `${Number(km2.toPrecision(2))} km²`;
	return `${Number((km2 * 1e6).toPrecision(2))} m²`;
}
