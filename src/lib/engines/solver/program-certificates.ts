import type { Program } from './program-builder.ts';

/**
 * No feasible point of `program` costs less: the bound that follows from prices on the rows, whatever
 * the prices are and whoever made them (weak duality of linear programs; Neumaier and Shcherbina,
 * "Safe bounds in linear and mixed-integer linear programming", 2004). It is computed here from the
 * program alone, so neither the tolerance nor an early stop of a solver can make it wrong; rounding is
 * taken off at the end. -Infinity where a price or a remaining cost leans on a limit that is not there.
 */
export function boundFromPrices(program: Program, prices: ArrayLike<number>): number {
	return weakBound(program, prices, program.cost);
}

/**
 * Whether `ray` proves that no point keeps all rows and limits of `program` (Farkas): the rows added
 * up with these weights must exceed what the columns can give.
 */
export function provesInfeasible(program: Program, ray: ArrayLike<number>): boolean {
	const zero = new Float64Array(program.columns);
	const size = largest(ray);
	if (!(size > 0)) return false;
	const unit = Float64Array.from(ray, (weight) => weight / size);
	return weakBound(program, unit, zero) > 1e-7;
}

function weakBound(program: Program, prices: ArrayLike<number>, cost: Float64Array): number {
	const rest = Float64Array.from(cost);
	let bound = 0;
	let magnitude = 0;
	for (let row = 0; row < program.rows; row++) {
		const price = usable(program, row, prices[row]);
		if (price === 0) continue;
		const term = price * (price > 0 ? program.rowLower[row] : program.rowUpper[row]);
		bound += term;
		magnitude += Math.abs(term);
		for (let i = program.starts[row]; i < program.starts[row + 1]; i++) {
			rest[program.indices[i]] -= price * program.coefficients[i];
		}
	}
	for (let column = 0; column < program.columns; column++) {
		if (Math.abs(rest[column]) < 1e-15) continue;
		const limit = rest[column] > 0 ? program.lower[column] : program.upper[column];
		if (!Number.isFinite(limit)) return -Infinity;
		bound += rest[column] * limit;
		magnitude += Math.abs(rest[column] * limit);
	}
	return bound - magnitude * 1e-12;
}

/** A price that leans on a missing limit of its row is no price: 0 is always allowed. */
function usable(program: Program, row: number, price: number): number {
	const limit = price > 0 ? program.rowLower[row] : program.rowUpper[row];
	return Number.isFinite(limit) && Number.isFinite(price) ? price : 0;
}

function largest(values: ArrayLike<number>): number {
	let most = 0;
	for (let i = 0; i < values.length; i++) most = Math.max(most, Math.abs(values[i]));
	return most;
}
