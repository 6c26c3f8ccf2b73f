import {
	readBoundaries,
	type BoundariesResult,
} from '../../../src/lib/engines/boundaries/index.ts';
import { fileSource } from '../../../src/lib/server/jobs/file-source.ts';
import { fractalNeighbours, type FractalLand } from '../../support/fractal-land.ts';
import { peakMegabytes } from './peak.ts';
import { Stopwatch } from './stopwatch.ts';

/**
 * File to neighbours with metres, in a process of its own: `ours.ts FILE [LAND]`. With a made-up land the
 * pairs are compared with its own. Prints a JSON line.
 */
const [file, land] = process.argv.slice(2);
const stages: Record<string, number> = {};
let stage = 'Reading';
let since = new Stopwatch();
const progress = (message: string) => {
	if (message.startsWith('Reading')) return;
	stages[stage] = (stages[stage] ?? 0) + since.taken().processorMilliseconds;
	[stage, since] = [message, new Stopwatch()];
};
const whole = new Stopwatch();
const read = await readBoundaries(fileSource(file, 'regions.geojson'), {}, { progress });
const times = whole.taken();
progress('');
const peak = peakMegabytes();
if (read.status !== 'accepted') throw new Error(JSON.stringify(read));
const agrees = land ? isSame(read, JSON.parse(land) as FractalLand) : undefined;
const { borders, coverage } = read;
const sizes = { regions: coverage.keys.length, borders: borders.a.length };
const again = await warm();
console.log(JSON.stringify({ ...times, peakMegabytes: peak, ...again, ...sizes, agrees, stages }));

/** The middle of three more readings of a small file, when the runtime has compiled what it runs. */
async function warm(): Promise<{ warmProcessorMilliseconds?: number }> {
	const source = fileSource(file, 'regions.geojson');
	if (source.size > 30e6) return {};
	const taken: number[] = [];
	for (let i = 0; i < 3; i++) {
		const watch = new Stopwatch();
		await readBoundaries(source);
		taken.push(watch.taken().processorMilliseconds);
	}
	return { warmProcessorMilliseconds: taken.sort((a, b) => a - b)[1] };
}

function isSame(read: Extract<BoundariesResult, { status: 'accepted' }>, land: FractalLand) {
	const numbers = read.coverage.keys.map(Number);
	const code = (p: number, q: number, kind: number) =>
		(Math.min(p, q) * land.regions + Math.max(p, q)) * 2 + kind;
	const { a, b, kind } = read.borders;
	const known = new Set(Array.from(a, (_, i) => code(numbers[a[i]], numbers[b[i]], kind[i])));
	let [pairs, missing] = [0, 0];
	fractalNeighbours(land, (p, q, isPoint) => {
		pairs++;
		if (!known.has(code(p, q, Number(isPoint)))) missing++;
	});
	return missing === 0 && pairs === a.length && known.size === a.length;
}
