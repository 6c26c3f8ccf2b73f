import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { cpuUsage } from 'node:process';
import { neighbors } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { checkExplanation } from '../../src/lib/engines/colouring/explain-check.ts';
import { explain } from '../../src/lib/engines/colouring/explain.ts';
import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';
import { Random } from '../../src/lib/engines/colouring/random.ts';
import { plainRelease } from '../support/plain-release.ts';
import { scatteredMap } from '../support/planar.ts';

const INKS = 4;

/**
 * Random locks on the 3,231 counties of us-atlas 3.0.1 (npm) with four inks: what collides and the
 * cheapest release. On smaller maps the same release is computed in the same run by one plain integer
 * program through HiGHS (npm highs). Processor time, since other work may share the machine.
 */
export async function* run(): AsyncGenerator<Record<string, unknown>> {
	const counties = await countyMap();
	await explain(withLocks(counties, 10, 9));
	for (const [locks, seeds] of [
		[100, 3],
		[600, 3],
		[1000, 1],
	]) {
		for (let seed = 1; seed <= seeds; seed++) {
			yield await measure('counties', withLocks(counties, locks, seed));
		}
	}
	for (const regions of [64, 144, 256]) {
		const problem = withLocks(scatteredMap(regions, 3), Math.round(regions / 4), 2);
		const record = await measure('scattered', problem);
		const start = processorTime();
		const plain = await plainRelease(problem);
		yield { ...record, plainRelease: plain, plainMilliseconds: processorTime() - start };
	}
}

async function measure(map: string, problem: ColouringProblem) {
	const start = processorTime();
	const explanation = await explain(problem);
	const milliseconds = processorTime() - start;
	return {
		benchmark: 'locks',
		map,
		regions: problem.regions,
		locks: problem.locks?.reduce((sum, ink) => sum + Number(ink >= 0), 0),
		milliseconds,
		collide: explanation?.locks.length ?? 0,
		shown: explanation?.regions.length ?? 0,
		release: explanation?.release?.cost ?? 0,
		lowerBound: explanation?.release?.lowerBound ?? 0,
		proved: explanation?.release?.proved ?? true,
		faults: explanation ? await checkExplanation(problem, explanation) : [],
	};
}

const processorTime = () => Math.round(cpuUsage().user / 1000);

type PlainMap = Pick<ColouringProblem, 'regions' | 'borders'>;

async function countyMap(): Promise<PlainMap> {
	const path = createRequire(import.meta.url).resolve('us-atlas/counties-10m.json');
	const topology = JSON.parse(await readFile(path, 'utf8')) as Topology;
	const counties = topology.objects.counties as GeometryCollection;
	const rows = neighbors(counties.geometries);
	const pairs = rows.flatMap((row, i) => row.filter((j) => j < i).map((j) => [i, j]));
	const borders = { a: pairs.map((pair) => pair[0]), b: pairs.map((pair) => pair[1]) };
	return { regions: rows.length, borders };
}

function withLocks(map: PlainMap, count: number, seed: number): ColouringProblem {
	const random = new Random(seed);
	const locks = new Int32Array(map.regions).fill(-1);
	for (let left = count; left > 0;) {
		const region = random.below(map.regions);
		if (locks[region] >= 0) continue;
		locks[region] = random.below(INKS);
		left--;
	}
	return { ...map, inks: INKS, locks };
}
