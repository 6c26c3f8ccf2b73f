import type { Highs, HighsCallbackMap, Model, ModelStatusCode } from 'highs';
import { boundFromPrices } from './program-certificates.ts';
import type { Program } from './program-builder.ts';

export interface ProgramLimits {
	/** most nodes of the branching, for programs with whole columns; absent: no limit */
	nodes?: number;
	/** most simplex iterations; of a program with whole columns, over all nodes; absent: no limit */
	iterations?: number;
	/** stops a run that takes longer; the answer is then 'limit' and depends on the machine */
	seconds?: number;
	/** asked at the solver's checkpoints; true stops the run as 'limit' */
	cancelled?: () => boolean;
	/** values to start a program with whole columns from */
	start?: Float64Array;
	/** solve linear programs by the interior-point method, sooner for large ones; default simplex */
	interior?: boolean;
}

export type ProgramOutcome =
	| {
			status: 'optimal';
			values: Float64Array;
			objective: number;
			/** no point costs less */
			bound: number;
			/** of each row, for a program without whole columns, else null */
			prices: Float64Array | null;
			spent: Spent;
	  }
	/** `ray`: weights on the rows that prove it (see provesInfeasible), where the solver gave them */
	| { status: 'infeasible'; ray: Float64Array | null }
	| { status: 'unbounded' }
	| {
			status: 'limit';
			/** the best point found, if any */
			values: Float64Array | null;
			objective: number | null;
			/** no point costs less; -Infinity where nothing is known */
			bound: number;
			prices: Float64Array | null;
			spent: Spent;
	  };

/** What the run took of its budgets. */
export interface Spent {
	nodes: number;
	iterations: number;
}

const TOLERANCE = 1e-6;
/** seconds; the solver refuses Infinity */
const FOREVER = 1e9;
const nothing = { values: null, objective: null, prices: null };
let loading: Promise<Highs> | null = null;

/**
 * Solves `program` by HiGHS (npm `highs`, WebAssembly; Huangfu and Hall 2018), loaded on first use.
 *
 * Arrays go over as they are; no text is written or parsed. Whole columns come back rounded, and the
 * point is as feasible as the solver's tolerance of 1e-6 allows: whoever claims a point keeps the
 * rules checks it against the rules. Bounds of linear programs are recomputed from the prices
 * (boundFromPrices). Same program and same budgets in nodes and iterations, same answer.
 * @throws RangeError when an index, cost or coefficient is out of range or not a number
 */
export async function solveProgram(
	program: Program,
	limits: ProgramLimits = {},
): Promise<ProgramOutcome> {
	mustBeSound(program);
	if (program.columns === 0) return withoutColumns(program);
	loading ??= import('highs').then(({ default: load }) => load());
	const highs = await loading;
	try {
		return highs.withModel((model) => solveWith(highs, model, program, limits));
	} catch (error) {
		// Out of memory ends the whole instance: the next call loads a fresh one.
		if (!(error instanceof WebAssembly.RuntimeError)) throw error;
		loading = null;
		return { status: 'limit', ...nothing, bound: -Infinity, spent: { nodes: 0, iterations: 0 } };
	}
}

function withoutColumns({ rowLower, rowUpper }: Program): ProgramOutcome {
	if (rowLower.some((low, row) => low > 0 || rowUpper[row] < 0)) {
		return { status: 'infeasible', ray: null };
	}
	const spent = { nodes: 0, iterations: 0 };
	return {
		status: 'optimal',
		values: new Float64Array(),
		objective: 0,
		bound: 0,
		prices: null,
		spent,
	};
}

function solveWith(highs: Highs, model: Model, program: Program, limits: ProgramLimits) {
	const mixed = program.integer.includes(1);
	model.options.set({
		output_flag: false,
		random_seed: 0,
		mip_rel_gap: 0,
		mip_max_nodes: limits.nodes ?? 2147483647,
		time_limit: Math.min(limits.seconds ?? FOREVER, FOREVER),
		solver: limits.interior && !mixed ? 'ipm' : 'choose',
	});
	if (!mixed && limits.iterations !== undefined) {
		model.options.set({ simplex_iteration_limit: limits.iterations });
	}
	pass(model, program, mixed);
	if (mixed && limits.start) model.setSolution({ colValue: limits.start });
	const stops = stopsOf(highs, limits);
	let { modelStatus } = model.run(stops);
	if (modelStatus === highs.constants.modelStatus.unboundedOrInfeasible) {
		model.options.set({ presolve: 'off' });
		({ modelStatus } = model.run(stops));
	}
	return outcomeOf(highs, model, program, mixed, modelStatus);
}

function pass(model: Model, program: Program, mixed: boolean): void {
	model.passModel({
		numCols: program.columns,
		numRows: program.rows,
		colCost: program.cost,
		colLower: program.lower,
		colUpper: program.upper,
		rowLower: program.rowLower,
		rowUpper: program.rowUpper,
		matrix: {
			format: 'csr',
			numRows: program.rows,
			numCols: program.columns,
			starts: program.starts,
			indices: program.indices,
			values: program.coefficients,
		},
		...(mixed ? { integrality: Int32Array.from(program.integer) } : {}),
	});
}

function stopsOf(highs: Highs, limits: ProgramLimits): HighsCallbackMap {
	const { cancelled, iterations = Infinity } = limits;
	const type = highs.constants.callbackType;
	if (!cancelled && iterations === Infinity) return {};
	return {
		[type.simplexInterrupt]: (event) => {
			if (cancelled?.()) event.interrupt();
			return undefined;
		},
		[type.mipInterrupt]: (event) => {
			const spent = Number(event.data.mip_total_lp_iterations ?? 0);
			if (spent > iterations || cancelled?.()) event.interrupt();
			return undefined;
		},
	};
}

function outcomeOf(
	highs: Highs,
	model: Model,
	program: Program,
	mixed: boolean,
	status: ModelStatusCode,
): ProgramOutcome {
	const { modelStatus, solutionStatus } = highs.constants;
	if (status === modelStatus.infeasible) {
		const ray = mixed ? undefined : model.getDualRay();
		return { status: 'infeasible', ray: ray ? Float64Array.from(ray.values) : null };
	}
	if (status === modelStatus.unbounded) return { status: 'unbounded' };
	const spent = spentBy(model);
	const found = Number(model.info.get('primal_solution_status')) === solutionStatus.feasible;
	// asked for earlier, the solver throws
	if (!found)
		return { status: 'limit', ...nothing, bound: mixed ? mixedBound(model) : -Infinity, spent };
	const solution = model.getSolution();
	const values = found ? rounded(program, solution.colValue) : null;
	const objective = values && costOf(program, values);
	const prices = mixed || solution.rowDual.length !== program.rows ? null : solution.rowDual;
	const bound = mixed ? mixedBound(model) : prices ? boundFromPrices(program, prices) : -Infinity;
	if (status === modelStatus.optimal && values && objective !== null) {
		return { status: 'optimal', values, objective, bound, prices, spent };
	}
	return { status: 'limit', values, objective, bound, prices, spent };
}

function spentBy(model: Model): Spent {
	const nodes = Number(model.info.get('mip_node_count'));
	const simplex = Number(model.info.get('simplex_iteration_count'));
	return { nodes: Math.max(0, nodes), iterations: Math.max(0, simplex) };
}

function mixedBound(model: Model): number {
	const bound = Number(model.info.get('mip_dual_bound'));
	// Bounds come as 5.0000000004.
	return Number.isFinite(bound) ? bound - TOLERANCE * Math.max(1, Math.abs(bound)) : -Infinity;
}

function rounded(program: Program, values: Float64Array): Float64Array {
	return values.map((value, column) => (program.integer[column] ? Math.round(value) : value));
}

function costOf(program: Program, values: Float64Array): number {
	let cost = 0;
	for (let column = 0; column < program.columns; column++) {
		cost += program.cost[column] * values[column];
	}
	return cost;
}

function mustBeSound(program: Program): void {
	if (program.indices.some((column) => !(column >= 0 && column < program.columns))) {
		throw new RangeError('a row names a column that is not there');
	}
	if (!program.cost.every(Number.isFinite) || !program.coefficients.every(Number.isFinite)) {
		throw new RangeError('costs and coefficients must be finite numbers');
	}
	for (const limits of [program.lower, program.upper, program.rowLower, program.rowUpper]) {
		if (limits.some(Number.isNaN)) throw new RangeError('a limit is not a number');
	}
}
