import {
	colourInOrder,
	hardMaps,
	properness,
	ruledFault,
	ruledProblem,
	type AnyMap,
} from '../support/adversary.ts';
import { minimumDegreeFive } from '../support/planar.ts';

/**
 * Adversarial runs of the four-ink colourer: `tsx tests/benchmarks/soak.ts [runs] [first seed]`. Hard
 * published maps and random triangulations of least degree five, vertices in random order. Of a hundred
 * runs five are forced to do without walks, one of them without chains, and two have locks, forbidden inks
 * and pairs alike and apart that a known colouring keeps. Ends with an error at the first run that fails.
 */
export async function soak(runs: number, firstSeed: number) {
	const named = hardMaps();
	const totals = { runs, walks: 0, longestWalk: 0, balls: 0, ballsForced: 0, ruled: 0 };
	let random: AnyMap = minimumDegreeFive(30, firstSeed);
	for (let i = 0; i < runs; i++) {
		const seed = firstSeed + i;
		if (i % 25 === 0) random = minimumDegreeFive(14 + (seed % 120), seed);
		const map = i % 5 < 4 ? named[i % 4] : random;
		const forced = i % 20 === 19;
		const options = { chains: i % 100 !== 99, walk: forced ? 0 : 1_000 };
		const { board, stats } = colourInOrder(map, seed, options);
		const fault = stats.finished ? properness(board) : 'not finished';
		if (fault) throw new Error(`Seed ${seed}: ${fault}`);
		if (i % 50 === 0) {
			const broken = await ruledFault(ruledProblem(random, seed));
			if (broken) throw new Error(`Seed ${seed}, with rules: ${broken}`);
			totals.ruled++;
		}
		totals.walks += stats.walks;
		totals.longestWalk = Math.max(totals.longestWalk, stats.longestWalk);
		totals[forced ? 'ballsForced' : 'balls'] += stats.stuck;
	}
	return totals;
}

if (process.argv[1]?.endsWith('soak.ts')) {
	const started = performance.now();
	const totals = await soak(Number(process.argv[2] ?? 500_000), Number(process.argv[3] ?? 1));
	const seconds = Math.round((performance.now() - started) / 1000);
	console.log(JSON.stringify({ name: 'soak', ...totals, seconds }));
}
