/** Literal codes inside the solver: 2v for variable v and 2v + 1 for its negation. */
export const encode = (literal: number) => (literal > 0 ? 2 * literal : -2 * literal + 1);

export const decode = (code: number) => ((code & 1) === 0 ? code >> 1 : -(code >> 1));

/** Sorted, each literal once; null when a literal and its negation make the clause always true. */
export function tidy(codes: number[]): number[] | null {
	const sorted = [...codes].sort((a, b) => a - b);
	const result: number[] = [];
	for (const code of sorted) {
		const last = result[result.length - 1];
		if (code === last) continue;
		if ((code ^ 1) === last) return null;
		result.push(code);
	}
	return result;
}
