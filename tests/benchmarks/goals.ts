import { cpuUsage } from 'node:process';
import { bordersForSheet } from '../../src/lib/engines/borders/index.ts';
import { checkColouring, colour } from '../../src/lib/engines/colouring/index.ts';
import { goalFigures, type GoalFigure } from '../../src/lib/engines/colouring/goal-figures.ts';
import type { GoalWish } from '../../src/lib/engines/colouring/goal-wish.ts';
import { Improver } from '../../src/lib/engines/colouring/improve.ts';
import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';
import { Random } from '../../src/lib/engines/colouring/random.ts';
import { housePalettes, inkDistances } from '../../src/lib/engines/palettes/index.ts';
import { bytesOf, usAtlas } from '../support/atlas.ts';
import { scatteredMap } from '../support/planar.ts';
import { accepted } from '../support/read-boundaries.ts';

/** Processor seconds after which each goal is looked at. */
const looks = [1, 3, 10];
const slice = 200_000;

interface Measured {
	problem: ColouringProblem;
	colouring: Int32Array;
	inks: number;
}

/**
 * What the improver reaches on the 3,231 counties of us-atlas 3.0.1 (npm) and on 33,000 generated regions
 * with made-up areas and lengths: figures before, and after 1, 3 and 10 seconds of processor time, since
 * other work may share the machine. Every colouring is checked, and figures are those of the checker.
 */
export async function* run(wanted: string[] = []): AsyncGenerator<object> {
	const maps = { counties: await counties(), scattered: await scattered(33_000) };
	for (const [map, measured] of Object.entries(maps)) {
		if (wanted.length && !wanted.includes(map)) continue;
		const uneven = { ...measured, colouring: skewed(measured) };
		yield* improved(map, uneven, [{ kind: 'even-count', give: 0 }]);
		yield* improved(map, uneven, [{ kind: 'even-area', give: 0 }]);
		yield* improved(map, measured, [{ kind: 'distinct', give: 0 }]);
		yield* improved(map, measured, [{ kind: 'same-ink-apart', give: 0 }]);
		yield* improved(map, measured, [
			{ kind: 'even-count', give: 0 },
			{ kind: 'distinct', give: 0 },
		]);
	}
}

function* improved(map: string, measured: Measured, wishes: GoalWish[]): Generator<object> {
	const { problem, colouring, inks } = measured;
	const told = (ink: Int32Array) => goalFigures(problem, ink, wishes, inks).map(inWords);
	const goals = wishes.map(({ kind }) => kind).join(', ');
	yield { map, regions: problem.regions, goals, seconds: 0, figures: told(colouring) };
	const started = processorSeconds();
	const improver = new Improver(problem, colouring, wishes, { inks, seed: 1 });
	improver.run(1);
	const beginSeconds = Math.round(100 * (processorSeconds() - started)) / 100;
	for (const seconds of looks) {
		while (processorSeconds() - started < seconds && !improver.ended) improver.run(slice);
		const spent = Math.round(100 * (processorSeconds() - started)) / 100;
		const { best, steps, ended } = improver;
		const faults = faultsOf(problem, best, inks);
		const weakest = improver.weakest && { weakestAvoidable: improver.weakest.avoidable };
		const more = { ...weakest, faults, beginSeconds };
		yield { map, goals, seconds: spent, steps, ended, figures: told(best), ...more };
		if (ended) return;
	}
}

/** The engine's own colouring is even by count: here every region takes the lowest ink it may have. */
function skewed({ problem, colouring }: Measured): Int32Array {
	const { a, b } = problem.borders;
	const around = Array.from({ length: problem.regions }, (): number[] => []);
	for (let i = 0; i < a.length; i++) {
		around[a[i]].push(b[i]);
		around[b[i]].push(a[i]);
	}
	const ink = colouring.slice();
	around.forEach((some, region) => {
		const taken = new Set(some.map((other) => ink[other]));
		ink[region] = [0, 1, 2, 3, 4, 5].find((one) => !taken.has(one)) ?? ink[region];
	});
	return ink;
}

const processorSeconds = () => cpuUsage().user / 1e6;

function inWords(figure: GoalFigure): object {
	switch (figure.kind) {
		case 'fewest-changes':
			return { changed: figure.changed };
		case 'same-ink-apart':
			return { pairs: figure.pairs };
		case 'distinct': {
			const km = figure.smallest && Math.round(figure.smallest.metres / 1000);
			const { distance } = figure.smallest ?? {};
			return { smallest: distance?.toFixed(1), alongKm: km, mean: figure.mean?.toFixed(2) };
		}
		default: {
			const loads = figure.loads.map(({ load }) => load);
			const mean = loads.reduce((sum, load) => sum + load, 0) / loads.length;
			const spread = (Math.max(...loads) - Math.min(...loads)) / mean;
			return { loads: loads.map(Math.round), spreadPerMillion: Math.round(1e8 * spread) / 100 };
		}
	}
}

function faultsOf(problem: ColouringProblem, colouring: Int32Array, inks: number): string[] {
	const inksUsed = colouring.reduce((most, ink) => Math.max(most, ink + 1), 0);
	const proof = { kind: 'not-proved' as const, regions: [] };
	const result = { status: 'coloured' as const, colouring, inksUsed, lowerBound: 1, proof };
	return checkColouring({ ...problem, inks }, result);
}

const distances = inkDistances(housePalettes[0].inks.map(({ hex }) => hex));

async function counties(): Promise<Measured> {
	const { coverage, borders: found } = await accepted(bytesOf(usAtlas('counties')));
	const rules = { pointTouches: false, leastMetres: 0, waterKm: 0, struck: [], added: [] };
	const borders = bordersForSheet(coverage.keys, found, rules);
	return coloured({
		...{ regions: coverage.keys.length, borders, inks: 'fewest' },
		...{ areas: coverage.areasKm2, lengths: borders.metres, inkDistances: distances },
	});
}

async function scattered(regions: number): Promise<Measured> {
	const map = scatteredMap(regions, 1);
	const random = new Random(1);
	const areas = Float64Array.from({ length: map.regions }, () => 10 + random.below(1e6) / 1e3);
	const lengths = Float64Array.from(map.borders.a, () => 500 + random.below(50_000));
	return coloured({ ...map, inks: 'fewest', areas, lengths, inkDistances: distances });
}

async function coloured(problem: ColouringProblem): Promise<Measured> {
	const result = await colour(problem);
	if (result.status !== 'coloured') throw new Error(result.status);
	return { problem, colouring: result.colouring, inks: result.inksUsed };
}

if (process.argv[1]?.endsWith('goals.ts')) {
	for await (const record of run(process.argv.slice(2))) console.log(JSON.stringify(record));
}
