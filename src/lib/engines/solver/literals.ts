/** Literal codes inside the solver: 2v for variable v and 2v + 1 for its negation. */
export const encode = (literal: number) => (literal > 0 ? 2 * literal : -2 * literal + 1);

export const decode = (code: number) => ((code & 1) === 0 ? code >> 1 : -(code >> 1));

/**
 * Writes the codes of literals, sorted and each once, to `into`; returns how many, or -1 when a literal
 * and its negation make the clause always true. By insertion: clauses are short.
 */
export function tidy(literals: readonly number[], into: number[]): number {
	let size = 0;
	for (let i = 0; i < literals.length; i++) {
		const code = encode(literals[i]);
		let at = size;
		while (at > 0 && into[at - 1] > code) at--;
		if (at > 0 && into[at - 1] === code) continue;
		if (at > 0 && into[at - 1] === (code ^ 1)) return -1;
		if (at < size && into[at] === (code ^ 1)) return -1;
		for (let k = size++; k > at; k--) into[k] = into[k - 1];
		into[at] = code;
	}
	return size;
}
