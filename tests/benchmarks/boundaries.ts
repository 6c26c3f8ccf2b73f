import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { cornersOnEdges, writeFractalLand, type FractalLand } from '../support/fractal-land.ts';
import { bytesOf, usAtlas, worldAtlas } from '../support/atlas.ts';

/** The longest text that Node.js 20 can hold (`buffer.constants.MAX_STRING_LENGTH`), in characters. */
const longestText = 536_870_888;

interface Case {
	name: string;
	land?: FractalLand;
	areas?: () => object;
	/** processor seconds and megabytes that were set as the goal */
	goal?: { seconds?: number; megabytes?: number };
}

const cases: Case[] = [
	{ name: 'counties', areas: () => usAtlas('counties'), goal: { seconds: 0.5 } },
	{ name: 'countries', areas: () => worldAtlas('10m') },
	{ name: '3142', land: { regions: 3142, inner: 23, seed: 1 }, goal: { seconds: 0.5 } },
	{
		name: '33000',
		land: { regions: 33_000, inner: 95, seed: 1 },
		goal: { seconds: 8, megabytes: 1000 },
	},
	{
		name: '100000',
		land: { regions: 100_000, inner: 47, seed: 1 },
		goal: { seconds: 13, megabytes: 1300 },
	},
	{ name: 'corners-on-edges', land: { regions: 3142, inner: 41, seed: 1, isHalved: true } },
];

/**
 * Boundary file to neighbours with metres, touches and findings, beside JSON.parse, topojson-server and
 * topojson-client's neighbors (line neighbours only): each in a process of its own, started on a file on
 * disk. Times are from the opened file to the list; peaks are of the whole process, its runtime included.
 */
export async function* run(wanted: string[] = []): AsyncGenerator<object> {
	const folder = mkdtempSync(join(tmpdir(), 'merestone-'));
	try {
		for (const one of cases) {
			if (wanted.length && !wanted.includes(one.name)) continue;
			const file = join(folder, `${one.name}.geojson`);
			if (one.land) await writeFractalLand(file, one.land);
			else writeFileSync(file, bytesOf(one.areas?.()));
			yield* compared(one, file);
			rmSync(file);
		}
	} finally {
		rmSync(folder, { recursive: true });
	}
}

function* compared({ name, land, goal }: Case, file: string): Generator<object> {
	const bytes = statSync(file).size;
	const ours = alone('ours.ts', file, ...(land ? [JSON.stringify(land)] : []));
	const corners = land?.isHalved ? { cornersOnEdges: cornersOnEdges(land) } : {};
	yield { name: `${name}: file to neighbours`, bytes, ...corners, ...ours, goal };
	if (bytes > longestText) {
		const why = `a text of ${bytes} characters is longer than ${longestText}`;
		yield { name: `${name}: topojson-server and neighbors`, left: why };
		return;
	}
	const theirs = alone('topojson.ts', file);
	const timesFaster = ratio(theirs.processorMilliseconds, ours.processorMilliseconds);
	const memoryShare = ratio(ours.peakMegabytes, theirs.peakMegabytes);
	yield { name: `${name}: topojson-server and neighbors`, ...theirs, timesFaster, memoryShare };
}

interface Measured {
	milliseconds: number;
	processorMilliseconds: number;
	peakMegabytes: number;
}

/** Runs one of the scripts in a process of its own and reads the line that it prints. */
function alone(script: string, ...args: string[]): Measured {
	const path = resolve(import.meta.dirname, 'alone', script);
	const memory = '--max-old-space-size=8000';
	const { stdout, status } = spawnSync(
		process.execPath,
		[memory, '--import', 'tsx', path, ...args],
		{
			encoding: 'utf8',
			stdio: ['ignore', 'pipe', 'inherit'],
		},
	);
	if (status !== 0) throw new Error(`${script} ended with code ${status}`);
	return JSON.parse(stdout) as Measured;
}

const ratio = (a: number, b: number) => Number((a / b).toFixed(2));

if (process.argv[1]?.endsWith('benchmarks/boundaries.ts')) {
	for await (const record of run(process.argv.slice(2))) console.log(JSON.stringify(record));
}
