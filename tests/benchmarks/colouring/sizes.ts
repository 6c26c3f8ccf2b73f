import { colour, type ColouringProblem } from '../../../src/lib/engines/colouring/index.ts';
import { buildGraph } from '../../../src/lib/engines/graph/index.ts';
import { scatteredMap, type PlanarMap } from '../../support/planar.ts';
import { median, record, type ColouringRecord } from './record.ts';
import { dsatur, greedySmallestLast } from './rivals.ts';

const goals = [
	[3_000, 10],
	[100_000, 1_000],
	[1_000_000, 10_000],
] as const;

/**
 * Colouring with certificate at three sizes, regions numbered at random, beside two heuristics on the same
 * graph; and the answer to a lock toggled among a hundred. Each time is the median of the runs.
 */
export async function* sizes(): AsyncGenerator<ColouringRecord> {
	for (const [size, goal] of goals) yield atSize(size, goal);
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
	return record({
		...{ name: 'colouring and certificate', regions: map.regions, milliseconds, goalMilliseconds },
		...{ inks, proof, dsaturMilliseconds, smallestLastMilliseconds, ...rivals },
	});
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
	const { regions } = map;
	return record({ name: 'lock toggled', regions, milliseconds, goalMilliseconds: 50 });
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
