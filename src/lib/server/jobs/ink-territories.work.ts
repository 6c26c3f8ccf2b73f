import { checkColouring, colour, type ColouringProblem } from '../../engines/colouring/index.ts';
import { buildGraph } from '../../engines/graph/index.ts';
import { territoryGraph } from '../../engines/territories/territory-graph.ts';
import type { Task } from './task-port.ts';

export interface InkTerritoriesInput {
	/** pairs of regions that must look different where they are in two territories */
	borders: { a: Uint32Array; b: Uint32Array };
	/** territory of every region, -1 for none */
	assignment: Int32Array;
	territories: number;
	/** ink of each territory before, -1 for a new one */
	previous: Int32Array;
	/** inks that the palette has */
	most: number;
}

export type InkedTerritories =
	| { status: 'inked'; inks: number[]; faults: string[] }
	/** the palette is too short; `needed` is null where that is not known */
	| { status: 'too-few'; needed: number | null };

/**
 * Inks for territories, so that the fewest of those that had one change it. The number of inks is the
 * least that does, or what the territories before used where that is more: a spare ink is no reason to
 * change any. Looked over by the checker, which shares no code with the colourer.
 */
export async function inkTerritories({
	input,
}: Task<InkTerritoriesInput>): Promise<InkedTerritories> {
	const { borders, assignment, territories, previous, most } = input;
	const regions = buildGraph(assignment.length, borders.a, borders.b);
	const plain: ColouringProblem = {
		regions: territories,
		borders: territoryGraph(regions, assignment, territories),
		inks: 'fewest',
		seed: 0,
	};
	const fewest = await colour(plain);
	if (fewest.status !== 'coloured') return { status: 'too-few', needed: null };
	if (fewest.inksUsed > most) {
		return { status: 'too-few', needed: fewest.lowerBound > most ? fewest.lowerBound : null };
	}
	const kept = previous.map((ink) => (ink < most ? ink : -1));
	const inks = Math.max(fewest.inksUsed, ...kept.map((ink) => ink + 1));
	const problem: ColouringProblem = { ...plain, inks, previous: kept, goal: 'fewest-changes' };
	const result = await colour(problem);
	if (result.status !== 'coloured') {
		throw new Error(`territories in ${inks} inks: ${result.status}, though fewer inks do`);
	}
	const faults = checkColouring(problem, result);
	return { status: 'inked', inks: Array.from(result.colouring), faults };
}
