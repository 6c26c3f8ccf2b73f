import { neighbors } from 'topojson-client';
import { topology } from 'topojson-server';
import type { GeometryCollection } from 'topojson-specification';
import { readBoundaries, sourceOf } from '../../src/lib/engines/boundaries/index.ts';
import { bytesOf, usAtlas, worldAtlas, type Areas } from '../support/atlas.ts';

const rounds = 5;

/** Milliseconds of processor time: other work on the machine does not count. */
async function measured(work: () => unknown): Promise<{ milliseconds: number; megabytes: number }> {
	const before = process.cpuUsage();
	const memory = process.memoryUsage().rss;
	let most = memory;
	const watch = setInterval(() => (most = Math.max(most, process.memoryUsage().rss)), 5);
	await work();
	most = Math.max(most, process.memoryUsage().rss);
	clearInterval(watch);
	const used = process.cpuUsage(before);
	return { milliseconds: (used.user + used.system) / 1000, megabytes: (most - memory) / 2 ** 20 };
}

/** The middle of several runs; the memory of the first, before the heap has grown. */
async function middle(work: () => unknown) {
	const runs = [];
	for (let i = 0; i < rounds; i++) runs.push(await measured(work));
	const times = runs.map((run) => run.milliseconds).sort((a, b) => a - b);
	return {
		milliseconds: Math.round(times[rounds >> 1]),
		firstMilliseconds: Math.round(runs[0].milliseconds),
		peakMegabytes: Math.round(runs[0].megabytes),
	};
}

/** File bytes -> pairs with metres, beside JSON.parse + topojson-server + neighbors (pairs only). */
export async function* run(): AsyncGenerator<object> {
	const files: [string, Areas][] = [
		['us-atlas states', usAtlas('states')],
		['us-atlas counties', usAtlas('counties')],
		['world-atlas countries 1:50m', worldAtlas('50m')],
	];
	for (const [file, areas] of files) {
		const bytes = bytesOf(areas);
		const ours = await middle(() => readBoundaries(sourceOf(file, bytes)));
		const theirs = await middle(() => reference(bytes));
		const ratio = Number((ours.milliseconds / theirs.milliseconds).toFixed(2));
		const shared = { regions: areas.features.length, bytes: bytes.length };
		yield { name: `${file}: bytes to borders`, ...shared, ...ours, ratio };
		yield { name: `${file}: topojson-server and neighbors`, ...shared, ...theirs, ratio: 1 };
	}
}

function reference(bytes: Uint8Array): number[][] {
	const areas = JSON.parse(new TextDecoder().decode(bytes)) as Areas;
	const made = topology({ areas }, 1e5);
	return neighbors((made.objects.areas as GeometryCollection).geometries);
}
