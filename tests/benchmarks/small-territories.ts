import { buildGraph } from '../../src/lib/engines/graph/index.ts';
import { planFrom, prepare } from '../../src/lib/engines/territories/index.ts';
import { preCheck } from '../../src/lib/engines/territories/pre-check.ts';
import { proveOrImprove } from '../../src/lib/engines/territories/prove.ts';
import { search } from '../../src/lib/engines/territories/search.ts';
import { scatteredMap } from '../support/planar.ts';
import { grownTerritories, logNormal, plainProblem } from '../support/territories.ts';

const processorSeconds = () => {
	const { user, system } = process.cpuUsage();
	return (user + system) / 1e6;
};

/**
 * Sixty units in four to six territories with locked bases, grown even and then drifted: what the search
 * finds, whether it is proved the cheapest, and the processor time of the proof. The goal is a proof
 * within 60 seconds in 95 of 100 cases. One record an instance.
 */
export async function* run(instances = 40) {
	for (let seed = 1; seed <= instances; seed++) yield one(seed);
}

async function one(seed: number) {
	const map = scatteredMap(60, seed);
	const graph = buildGraph(map.regions, map.borders.a, map.borders.b);
	const even = logNormal(graph.count, 0.5, seed);
	const drift = logNormal(graph.count, 0.3, seed + 1000);
	const count = 4 + (seed % 3);
	const { today, bases } = grownTerritories(graph, even, count, seed);
	const load = even.map((value, unit) => value * drift[unit]);
	const tolerance = [0.1, 0.15, 0.2][seed % 3];
	const prepared = prepare(plainProblem(graph, load, today, bases, tolerance));
	if ('status' in prepared) throw new Error(prepared.message);
	if (preCheck(prepared)) return { name: 'small territories', seed, outcome: 'told at once' };
	const found = await search(prepared);
	const sound = found !== null && found.sound && found.conflicts === 0;
	const plan = sound ? planFrom(prepared, found.assignment) : null;
	const before = processorSeconds();
	const answer = await proveOrImprove(prepared, plan);
	const seconds = Math.round((processorSeconds() - before) * 10) / 10;
	const record = { name: 'small territories', seed, count, tolerance, seconds, found: plan?.cost };
	if (!answer) return { ...record, outcome: 'open' };
	if ('impossible' in answer) return { ...record, outcome: 'impossible' };
	return { ...record, outcome: answer.proved ? 'proved' : 'open', least: answer.cost };
}
