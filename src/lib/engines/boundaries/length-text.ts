/** A length for a sentence: metres with two digits, kilometres from one on. */
export function lengthText(metres: number): string {
	if (metres >= 10_000) return `${Math.round(metres / 1000)} km`;
	if (metres >= 1000) return `${Number((metres / 1000).toPrecision(2))} km`;
	return `${Number(metres.toPrecision(metres >= 100 ? 3 : 2))} m`;
}
