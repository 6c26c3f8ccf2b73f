import { checkExplanation } from '../../../src/lib/engines/colouring/explain-check.ts';
import { explain } from '../../../src/lib/engines/colouring/explain.ts';
import type { ColouringProblem } from '../../../src/lib/engines/colouring/problem.ts';
import { Random } from '../../../src/lib/engines/colouring/random.ts';
import { plainRelease } from '../../support/plain-release.ts';
import { scatteredMap } from '../../support/planar.ts';
import { countyMap } from './county-map.ts';
import { processorTime, record, type ColouringRecord } from './record.ts';

const INKS = 4;

/** Locks, seeds, whether bordering ones differ, whether they have weights from 1 to 9, and the goal. */
const cases = [
	{ locks: 100, seeds: [1, 2, 3], goal: 1_000 },
	{ locks: 300, seeds: [1, 2], goal: 1_000, proper: true },
	{ locks: 600, seeds: [1, 2, 3], goal: 3_000 },
	{ locks: 600, seeds: [1, 2], goal: 3_000, proper: true, weighed: true },
	{ locks: 1_000, seeds: [1] },
];

/**
 * Random locks on the counties with four inks: an irreducible set that collides and the cheapest release.
 * On smaller maps the same release is computed in the same run by one plain integer program through HiGHS
 * (npm highs). Processor time, since other work may share the machine.
 */
export async function* locks(): AsyncGenerator<ColouringRecord> {
	const counties = await countyMap();
	await explain(withLocks(counties, { locks: 10 }, 9));
	for (const one of cases) {
		for (const seed of one.seeds) {
			const measured = await measure('counties', withLocks(counties, one, seed));
			const { proper = false, weighed = false, goal } = one;
			yield record({ ...measured, proper, weighed, goalMilliseconds: goal });
		}
	}
	for (const regions of [64, 144, 256]) {
		const map = scatteredMap(regions, 3);
		const problem = withLocks(map, { locks: Math.round(regions / 4) }, 2);
		const measured = await measure('scattered', problem);
		const start = processorTime();
		const plain = await plainRelease(problem);
		const plainMilliseconds = processorTime() - start;
		const met = measured.met && plain === measured.release;
		yield { ...measured, met, plainRelease: plain, plainMilliseconds };
	}
}

async function measure(map: string, problem: ColouringProblem): Promise<ColouringRecord> {
	const start = processorTime();
	const explanation = await explain(problem);
	const milliseconds = processorTime() - start;
	const faults = explanation ? await checkExplanation(problem, explanation) : [];
	const release = explanation?.release;
	return {
		...{ name: 'locks released', map, regions: problem.regions, milliseconds },
		locks: problem.locks?.reduce((sum, ink) => sum + Number(ink >= 0), 0),
		collide: explanation?.locks.length ?? 0,
		shown: explanation?.regions.length ?? 0,
		release: release?.cost ?? 0,
		lowerBound: release?.lowerBound ?? 0,
		met: (release?.proved ?? true) && faults.length === 0,
	};
}

type PlainMap = Pick<ColouringProblem, 'regions' | 'borders'>;
type Wish = { locks: number; proper?: boolean; weighed?: boolean };

function withLocks(map: PlainMap, wish: Wish, seed: number): ColouringProblem {
	const random = new Random(seed);
	const locks = new Int32Array(map.regions).fill(-1);
	const beside: number[][] = Array.from({ length: map.regions }, () => []);
	for (let i = 0; i < map.borders.a.length; i++) {
		beside[map.borders.a[i]].push(map.borders.b[i]);
		beside[map.borders.b[i]].push(map.borders.a[i]);
	}
	for (let left = wish.locks; left > 0;) {
		const region = random.below(map.regions);
		if (locks[region] >= 0) continue;
		const ink = random.below(INKS);
		if (wish.proper && beside[region].some((other) => locks[other] === ink)) continue;
		locks[region] = ink;
		left--;
	}
	const problem: ColouringProblem = { ...map, inks: INKS, locks };
	if (wish.weighed) problem.lockCosts = Float64Array.from(locks, () => 1 + random.below(9));
	return problem;
}
