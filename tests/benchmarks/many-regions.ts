import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readBoundaries } from '../../src/lib/engines/boundaries/index.ts';
import { fileSource } from '../../src/lib/server/jobs/file-source.ts';
import { writeManyRegions } from '../support/many-regions.ts';

/** 33,000 regions and 12.7 million coordinates from a file, once: processor time of each stage, and memory. */
export async function* run(): AsyncGenerator<object> {
	const folder = mkdtempSync(join(tmpdir(), 'merestone-'));
	try {
		const file = join(folder, 'regions.geojson');
		const bytes = await writeManyRegions(file, { cells: 182, inner: 95, seed: 1 });
		const stages: Record<string, number> = {};
		let [stage, since] = ['Reading', process.cpuUsage()];
		const next = (message: string) => {
			const { user, system } = process.cpuUsage(since);
			stages[stage] = Math.round((stages[stage] ?? 0) + (user + system) / 1000);
			[stage, since] = [message, process.cpuUsage()];
		};
		const start = process.cpuUsage();
		const progress = (message: string) => {
			if (!message.startsWith('Reading')) next(message);
		};
		const read = await readBoundaries(fileSource(file, 'regions.geojson'), {}, { progress });
		next('');
		if (read.status !== 'accepted') throw new Error(JSON.stringify(read));
		const { user, system } = process.cpuUsage(start);
		yield {
			name: 'made-up land: bytes to borders',
			regions: read.coverage.keys.length,
			borders: read.borders.a.length,
			bytes,
			milliseconds: Math.round((user + system) / 1000),
			peakMegabytes: Math.round(process.resourceUsage().maxRSS / 1024),
			stages,
		};
	} finally {
		rmSync(folder, { recursive: true });
	}
}
