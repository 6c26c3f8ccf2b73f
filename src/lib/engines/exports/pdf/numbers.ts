/** Hundredths of a millimetre to points: 1 pt is 1/72 inch, an inch 25.4 mm (ISO 32000-1, 8.3.2.3). */
export const pointsPerUnit = 72 / 2540;

/** A number as PDF takes it: no exponent, three decimals, which is a thousandth of a point. */
export const decimal = (value: number): string => String(Math.round(value * 1000) / 1000 || 0);

/** `#rrggbb` as three shares of one. */
export function rgb(hex: string): string {
	const channel = (at: number) =>
		Math.round((parseInt(hex.slice(at, at + 2), 16) / 255) * 1e4) / 1e4;
	return `${channel(1)} ${channel(3)} ${channel(5)}`;
}
