import { colourInOrder, hardMaps, properness, type AnyMap } from '../support/adversary.ts';
import { minimumDegreeFive } from '../support/planar.ts';

/**
 * Adversarial runs of the four-ink colourer: `tsx tests/benchmarks/soak.ts [runs] [first seed]`. Hard
 * published maps and random triangulations of least degree five, vertices in random order; every
 * twentieth run without walks and every hundredth without chains, so that balls must do. Ends with an
 * error at the first run that fails.
 */
export function soak(runs: number, firstSeed: number) {
	const named = hardMaps();
	const totals = { runs, walks: 0, longestWalk: 0, balls: 0 };
	let random: AnyMap = minimumDegreeFive(30, firstSeed);
	for (let i = 0; i < runs; i++) {
		const seed = firstSeed + i;
		if (i % 25 === 0) random = minimumDegreeFive(14 + (seed % 120), seed);
		const map = i % 5 < 4 ? named[i % 4] : random;
		const options = { chains: i % 100 !== 99, walk: i % 20 === 19 ? 0 : 1_000 };
		const { board, stats } = colourInOrder(map, seed, options);
		const fault = stats.finished ? properness(board) : 'not finished';
		if (fault) throw new Error(`Seed ${seed}: ${fault}`);
		totals.walks += stats.walks;
		totals.longestWalk = Math.max(totals.longestWalk, stats.longestWalk);
		totals.balls += stats.stuck;
	}
	return totals;
}

if (process.argv[1]?.endsWith('soak.ts')) {
	const started = performance.now();
	const totals = soak(Number(process.argv[2] ?? 500_000), Number(process.argv[3] ?? 1));
	const seconds = Math.round((performance.now() - started) / 1000);
	console.log(JSON.stringify({ name: 'soak', ...totals, seconds }));
}
