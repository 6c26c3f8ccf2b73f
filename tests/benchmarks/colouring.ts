import { colour, type ColouringProblem } from '../../src/lib/engines/colouring/index.ts';
import { buildGraph } from '../../src/lib/engines/graph/index.ts';
import { scatteredMap, type PlanarMap } from '../support/planar.ts';
import { dsatur, greedySmallestLast } from './rivals.ts';

export interface ColouringRecord {
	name: string;
	regions: number;
	milliseconds: number;
	goalMilliseconds: number;
	inks?: number;
	[more: string]: number | string | undefined;
}

/**
 * Colouring with certificate at three sizes, beside two heuristics on the same graph, and the answer to
 * a lock toggled among a hundred. Regions are named at random. Each time is the median of the runs.
 */
export async function* run(sizes = [3_000, 100_000, 1_000_000]): AsyncGenerator<ColouringRecord> {
	const goals: Record<number, number> = { 3_000: 10, 100_000: 1_000, 1_000_000: 10_000 };
	for (const size of sizes) yield atSize(size, goals[size] ?? NaN);
	yield lockToggle(3_000);
}

async function atSize(size: number, goalMilliseconds: number): Promise<ColouringRecord> {
	const map = scatteredMap(size, 1);
	const graph = buildGraph(map.regions, map.borders.a, map.borders.b);
	const runs = size > 200_000 ? 1 : size > 10_000 ? 3 : 30;
	let inks = 0;
	let proof = '';
	const milliseconds = await median(runs, async () => {
		const result = await colour({ ...map, inks: 'fewest' });
		if (result.status !== 'coloured') throw new Error(result.status);
		inks = result.inksUsed;
		proof = result.proof.kind;
	});
	const rivals = { dsaturInks: 0, smallestLastInks: 0 };
	const few = Math.min(runs, 3);
	const dsaturMilliseconds = await median(few, () => (rivals.dsaturInks = dsatur(graph)));
	const smallestLastMilliseconds = await median(
		few,
		() => (rivals.smallestLastInks = greedySmallestLast(graph)),
	);
	return {
		name: 'colouring and certificate',
		regions: map.regions,
		milliseconds,
		goalMilliseconds,
		inks,
		proof,
		dsaturMilliseconds,
		smallestLastMilliseconds,
		...rivals,
	};
}

/** A hundred locks taken from a colouring, then one of them off and on again. */
async function lockToggle(size: number): Promise<ColouringRecord> {
	const map = scatteredMap(size, 2);
	const problem = await withLocks(map, 100);
	const locks = problem.locks as Int32Array;
	const locked = [...locks.keys()].filter((r) => locks[r] >= 0);
	let turn = 0;
	const milliseconds = await median(20, async () => {
		const toggled = locks.slice();
		toggled[locked[turn++ % locked.length]] = -1;
		const result = await colour({ ...problem, locks: toggled });
		if (result.status !== 'coloured') throw new Error(result.status);
	});
	return { name: 'lock toggled', regions: map.regions, milliseconds, goalMilliseconds: 50 };
}

async function withLocks(map: PlanarMap, count: number): Promise<ColouringProblem> {
	const result = await colour({ ...map, inks: 4, seed: 9 });
	if (result.status !== 'coloured') throw new Error(result.status);
	const locks = new Int32Array(map.regions).fill(-1);
	for (let i = 0; i < count; i++) {
		const r = Math.floor((i * map.regions) / count);
		locks[r] = result.colouring[r];
	}
	return { ...map, inks: 4, locks };
}

async function median(runs: number, work: () => unknown): Promise<number> {
	const times: number[] = [];
	for (let i = 0; i < runs; i++) {
		const started = performance.now();
		await work();
		times.push(performance.now() - started);
	}
	times.sort((a, b) => a - b);
	return Math.round(times[runs >> 1] * 100) / 100;
}

if (process.argv[1]?.endsWith('colouring.ts')) {
	for await (const record of run()) console.log(JSON.stringify(record));
}
