type ProgramSolver = (
	sets: readonly number[][],
	costs: ArrayLike<number>,
) => { chosen: number[]; proved: boolean } | null;

const MOST_NODES = 20_000;

let loading: Promise<ProgramSolver> | null = null;

/**
 * Loads HiGHS (npm `highs`, WebAssembly, 3.5 MB) the first time it is called. The solver returned
 * writes each problem as text; the library frees the model when it returns.
 */
export function loadProgramSolver(): Promise<ProgramSolver> {
	loading ??= import('highs').then(async ({ default: load }) => {
		const highs = await load();
		return (sets, costs) => {
			const elements = [...new Set(sets.flat())].sort((a, b) => a - b);
			const result = highs.solve(programText(sets, elements, costs), {
				output_flag: false,
				mip_rel_gap: 0,
				mip_max_nodes: MOST_NODES,
				random_seed: 0,
			});
			if (!result.Columns) return null;
			const columns = result.Columns as Record<string, { Primal?: number }>;
			// Values come as 0.9999999997: everything from a half up is one.
			const chosen = elements.filter((element) => (columns[`x${element}`]?.Primal ?? 0) > 0.5);
			return { chosen, proved: result.Status === 'Optimal' };
		};
	});
	return loading;
}

/** In the CPLEX LP form. Costs are scaled so that the largest is 1, for the sake of tolerances. */
function programText(
	sets: readonly number[][],
	elements: readonly number[],
	costs: ArrayLike<number>,
): string {
	const largest = Math.max(...elements.map((element) => costs[element]));
	const terms = elements.map((element) => `${(costs[element] / largest).toFixed(12)} x${element}`);
	const rows = sets.map((set) => ` ${set.map((element) => `x${element}`).join(' + ')} >= 1`);
	const names = elements.map((element) => ` x${element}`);
	return [
		'Minimize',
		` ${terms.join('\n + ')}`,
		'Subject To',
		...rows,
		'Binary',
		...names,
		'End',
	].join('\n');
}
