import type { Coverage } from '../geometry/coverage.ts';
import { CoastRuns } from './coast-runs.ts';
import { geodesicNearest, roughNearest } from './nearest-geodesic.ts';

/** The shortest way between two regions that do not touch. */
export interface Gap {
	a: number;
	b: number;
	metres: number;
	from: [number, number];
	/** longitude may lie past 180 where the way crosses that meridian */
	to: [number, number];
}

/** A corner and a segment that may be the nearest places of two regions. */
interface Candidate {
	corner: number;
	segment: number;
	/** degrees that the segment is moved by to lie beside the corner */
	turn: number;
	share: number;
	metres: number;
}

interface Pair {
	a: number;
	b: number;
	rough: number;
	candidates: Candidate[];
}

/** Candidates this much farther than the best are measured exactly too. */
const slack = 1.01;
const mostCandidates = 64;
const widenings = 7;

/**
 * The gaps up to `most` metres between regions that are not `known` to touch, found by looking farther
 * and farther: each distance twice the one before. `steps` bounds the work (pairs of runs looked at, each
 * measured one counting for twenty); when it runs out, `within` says up to which distance all are found.
 */
export function gapsUpTo(
	coverage: Coverage,
	most: number,
	known: (a: number, b: number) => boolean,
	steps: number,
): { gaps: Gap[]; within: number } {
	const search = new GapSearch(coverage, known, steps);
	let within = 0;
	for (let widening = widenings - 1; widening >= 0; widening--) {
		const reach = most / 2 ** widening;
		if (!search.upTo(reach * slack, within)) break;
		within = reach;
	}
	const gaps = search.gaps().filter(({ metres }) => metres <= within);
	return { gaps: gaps.sort((p, q) => p.a - q.a || p.b - q.b), within };
}

class GapSearch {
	private runs: CoastRuns;
	private pairs = new Map<number, Pair>();

	constructor(
		private coverage: Coverage,
		private known: (a: number, b: number) => boolean,
		private steps: number,
	) {
		this.runs = new CoastRuns(coverage);
	}

	/** Looks at all runs within `reach` metres; false when the steps ran out before the end. */
	upTo(reach: number, settled: number): boolean {
		const { runs } = this;
		const turns = runs.isRound ? [0, 360, -360] : [0];
		for (let run = 0; run < runs.count; run++) {
			for (const turn of turns) {
				runs.around(run, reach, turn, (other) => {
					if (other > run) this.look(run, other, turn, reach, settled);
				});
				if (this.steps < 0) return false;
			}
		}
		return true;
	}

	private look(run: number, other: number, turn: number, reach: number, settled: number): void {
		this.steps--;
		const { region } = this.runs;
		if (region[run] === region[other] || this.steps < 0) return;
		const a = Math.min(region[run], region[other]);
		const b = Math.max(region[run], region[other]);
		const code = a * this.coverage.keys.length + b;
		let pair = this.pairs.get(code);
		const best = pair?.rough ?? Infinity;
		if (best <= settled / slack || this.known(a, b)) return;
		if (this.runs.apart(run, other, turn) > Math.min(reach, best * slack)) return;
		this.steps -= 20;
		if (!pair) this.pairs.set(code, (pair = { a, b, rough: Infinity, candidates: [] }));
		this.measure(pair, run, other, turn);
		this.measure(pair, other, run, -turn);
	}

	/** Every corner of one run against every segment of the other. */
	private measure(pair: Pair, corners: number, segments: number, turn: number): void {
		const { first, last } = this.runs;
		const p = this.coverage.arcPoints;
		for (let c = first[corners]; c <= last[corners]; c++) {
			for (let s = first[segments]; s < last[segments]; s++) {
				const { share, metres } = roughNearest(
					...([p[2 * c], p[2 * c + 1]] as const),
					...([p[2 * s] - turn, p[2 * s + 1]] as const),
					...([p[2 * s + 2] - turn, p[2 * s + 3]] as const),
				);
				if (metres > pair.rough * slack) continue;
				pair.candidates.push({ corner: c, segment: s, turn, share, metres });
				pair.rough = Math.min(pair.rough, metres);
				if (pair.candidates.length > 4 * mostCandidates) trim(pair);
			}
		}
	}

	gaps(): Gap[] {
		return [...this.pairs.values()].map((pair) => {
			trim(pair);
			const ways = pair.candidates.map((candidate) => this.exactly(pair, candidate));
			return ways.reduce((p, q) => (q.metres < p.metres ? q : p));
		});
	}

	private exactly({ a, b }: Pair, { corner, segment, turn, share }: Candidate): Gap {
		const p = this.coverage.arcPoints;
		const from: [number, number] = [p[2 * corner], p[2 * corner + 1]];
		const { x, y, metres } = geodesicNearest(
			...from,
			...([p[2 * segment] - turn, p[2 * segment + 1]] as const),
			...([p[2 * segment + 2] - turn, p[2 * segment + 3]] as const),
			share,
		);
		return { a, b, metres, from, to: [x, y] };
	}
}

/** The nearest candidates, so many at most. */
function trim(pair: Pair): void {
	pair.candidates = pair.candidates
		.filter(({ metres }) => metres <= pair.rough * slack)
		.sort((p, q) => p.metres - q.metres)
		.slice(0, mostCandidates);
}
