/**
 * A linear or integer program in flat arrays: least `cost . x` with `lower <= x <= upper` and
 * `rowLower <= A x <= rowUpper`. Row r of A is `indices` and `coefficients` from `starts[r]` to
 * `starts[r + 1] - 1`. Infinity stands for no limit.
 */
export interface Program {
	columns: number;
	cost: Float64Array;
	lower: Float64Array;
	upper: Float64Array;
	/** 1 for a column that must be whole */
	integer: Uint8Array;
	rows: number;
	rowLower: Float64Array;
	rowUpper: Float64Array;
	/** rows + 1 */
	starts: Int32Array;
	indices: Int32Array;
	coefficients: Float64Array;
}

/** Grows a program column by column and row by row; both are numbered from 0 in the order added. */
export class ProgramBuilder {
	private readonly cost: number[] = [];
	private readonly lower: number[] = [];
	private readonly upper: number[] = [];
	private readonly integer: number[] = [];
	private readonly rowLower: number[] = [];
	private readonly rowUpper: number[] = [];
	private readonly starts: number[] = [0];
	private readonly indices: number[] = [];
	private readonly coefficients: number[] = [];

	get columns(): number {
		return this.cost.length;
	}

	get rows(): number {
		return this.rowLower.length;
	}

	/** A real column. */
	real(cost: number, lower = 0, upper = Infinity): number {
		return this.column(cost, lower, upper, 0);
	}

	/** A whole column, 0 or 1 unless said otherwise. */
	whole(cost: number, lower = 0, upper = 1): number {
		return this.column(cost, lower, upper, 1);
	}

	/**
	 * `lower <= sum of coefficients[i] x[columns[i]] <= upper`. Coefficients may be one number for all;
	 * a column may be named only once.
	 */
	row(
		lower: number,
		upper: number,
		columns: ArrayLike<number>,
		coefficients: ArrayLike<number> | number = 1,
	): number {
		for (let i = 0; i < columns.length; i++) {
			this.indices.push(columns[i]);
			this.coefficients.push(typeof coefficients === 'number' ? coefficients : coefficients[i]);
		}
		this.starts.push(this.indices.length);
		this.rowUpper.push(upper);
		return this.rowLower.push(lower) - 1;
	}

	build(): Program {
		return {
			columns: this.columns,
			cost: Float64Array.from(this.cost),
			lower: Float64Array.from(this.lower),
			upper: Float64Array.from(this.upper),
			integer: Uint8Array.from(this.integer),
			rows: this.rows,
			rowLower: Float64Array.from(this.rowLower),
			rowUpper: Float64Array.from(this.rowUpper),
			starts: Int32Array.from(this.starts),
			indices: Int32Array.from(this.indices),
			coefficients: Float64Array.from(this.coefficients),
		};
	}

	private column(cost: number, lower: number, upper: number, integer: 0 | 1): number {
		this.lower.push(lower);
		this.upper.push(upper);
		this.integer.push(integer);
		return this.cost.push(cost) - 1;
	}
}
