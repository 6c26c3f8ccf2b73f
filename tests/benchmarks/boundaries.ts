import { neighbors } from 'topojson-client';
import { topology } from 'topojson-server';
import type { GeometryCollection } from 'topojson-specification';
import { readBoundaries, sourceOf } from '../../src/lib/engines/boundaries/index.ts';
import { bytesOf, usAtlas, worldAtlas, type Areas } from '../support/atlas.ts';

const rounds = 5;

/**
 * Milliseconds of processor time, so that other work on the machine does not count: the first run, and
 * the middle of the next five. Memory is the most the process has held so far.
 */
async function measured(work: () => unknown) {
	const times: number[] = [];
	for (let i = 0; i <= rounds; i++) {
		const before = process.cpuUsage();
		await work();
		const used = process.cpuUsage(before);
		times.push((used.user + used.system) / 1000);
	}
	const [first, ...later] = times;
	later.sort((a, b) => a - b);
	return {
		milliseconds: Math.round(later[rounds >> 1]),
		firstMilliseconds: Math.round(first),
		peakMegabytes: Math.round(process.resourceUsage().maxRSS / 1024),
	};
}

/** File bytes -> pairs with metres, beside JSON.parse + topojson-server + neighbors (pairs only). */
export async function* run(): AsyncGenerator<object> {
	const files: [string, Areas][] = [
		['us-atlas states', usAtlas('states')],
		['us-atlas counties', usAtlas('counties')],
		['world-atlas countries 1:50m', worldAtlas('50m')],
		['world-atlas countries 1:10m', worldAtlas('10m')],
	];
	for (const [file, areas] of files) {
		const bytes = bytesOf(areas);
		const ours = await measured(() => readBoundaries(sourceOf(file, bytes)));
		const theirs = await measured(() => reference(bytes));
		const ratio = Number((ours.milliseconds / theirs.milliseconds).toFixed(2));
		const shared = { regions: areas.features.length, bytes: bytes.length };
		yield { name: `${file}: bytes to borders`, ...shared, ...ours, ratio };
		yield { name: `${file}: topojson-server and neighbors`, ...shared, ...theirs, ratio: 1 };
	}
}

function reference(bytes: Uint8Array): number[][] {
	const areas = JSON.parse(new TextDecoder().decode(bytes)) as Areas;
	const made = topology({ areas });
	return neighbors((made.objects.areas as GeometryCollection).geometries);
}
