import type { Sat } from '../solver/sat.ts';

/**
 * Counts true literals: output i (from 0) is forced true when more than i of the inputs are.
 *
 * Source: O. Bailleux, Y. Boufkhad, Efficient CNF encoding of Boolean cardinality constraints, CP 2003.
 */
export function totalizer(sat: Sat, inputs: number[]): number[] {
	if (inputs.length === 1) return inputs;
	const middle = inputs.length >> 1;
	const left = totalizer(sat, inputs.slice(0, middle));
	const right = totalizer(sat, inputs.slice(middle));
	const outputs = inputs.map(() => sat.newVariable());
	for (let i = 0; i <= left.length; i++) {
		for (let j = 0; j <= right.length; j++) {
			if (i + j === 0) continue;
			const clause = [outputs[i + j - 1]];
			if (i > 0) clause.push(-left[i - 1]);
			if (j > 0) clause.push(-right[j - 1]);
			sat.addClause(clause);
		}
	}
	return outputs;
}
