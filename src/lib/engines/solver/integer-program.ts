export interface ProgramAnswer {
	chosen: number[];
	lowerBound: number;
	proved: boolean;
}

type ProgramSolver = (
	sets: readonly number[][],
	costs: ArrayLike<number>,
	nodes: number,
) => ProgramAnswer | null;

const OPTIMAL = 7;
const TOLERANCE = 1e-6;

let loading: Promise<ProgramSolver> | null = null;

/**
 * Loads HiGHS (npm `highs`, WebAssembly, 3.5 MB) the first time it is called. The solver returned
 * writes each problem as text, takes `nodes` as the most nodes of its search, and frees the model.
 */
export function loadProgramSolver(): Promise<ProgramSolver> {
	loading ??= import('highs').then(async ({ default: load }) => {
		const highs = await load();
		return (sets, costs, nodes) => {
			const elements = [...new Set(sets.flat())].sort((a, b) => a - b);
			const scale = Math.max(...elements.map((element) => costs[element]));
			const data = programText(sets, elements, (element) => costs[element] / scale);
			return highs.withModel({ format: 'lp', data }, (model) => {
				model.options.set({
					output_flag: false,
					mip_rel_gap: 0,
					mip_max_nodes: nodes,
					random_seed: 0,
				});
				model.run();
				const values = model.getSolution().colValue;
				if (values.length !== elements.length) return null;
				// Values come as 0.9999999997: everything from a half up is one.
				const chosen = elements.filter((_, column) => values[column] > 0.5);
				const bound = Number(model.info.get('mip_dual_bound')) * scale;
				const whole = elements.every((element) => Number.isInteger(costs[element]));
				return {
					chosen,
					lowerBound: whole ? Math.ceil(bound - TOLERANCE * scale) : bound - TOLERANCE * scale,
					proved: model.getModelStatus() === OPTIMAL,
				};
			});
		};
	});
	return loading;
}

/** In the CPLEX LP form; columns come in the order of the elements. Costs are at most 1. */
function programText(
	sets: readonly number[][],
	elements: readonly number[],
	cost: (element: number) => number,
): string {
	const terms = elements.map((element) => `${cost(element).toFixed(12)} x${element}`);
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
