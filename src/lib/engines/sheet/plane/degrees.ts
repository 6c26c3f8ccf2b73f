/** A latitude or longitude in words: `29.5° N`, `96° W`, `0°`. */
function degrees(value: number, positive: string, negative: string): string {
	const size = Number(Math.abs(value).toFixed(2));
	if (size === 0) return '0°';
	return `${size}° ${value > 0 ? positive : negative}`;
}

export const latitudeWords = (lat: number): string => degrees(lat, 'N', 'S');

export function longitudeWords(lon: number): string {
	return Math.abs(lon) === 180 ? '180°' : degrees(lon, 'E', 'W');
}

/** A step fit for printing, about a fortieth of the span: 5, 1, 0.5, 0.1 or 0.01 degrees. */
export function degreeStep(span: number): number {
	return [5, 1, 0.5, 0.1].find((step) => span / 40 >= step) ?? (span >= 1 ? 0.1 : 0.01);
}

export function roundTo(value: number, step: number): number {
	return Number((Math.round(value / step) * step).toFixed(2));
}
