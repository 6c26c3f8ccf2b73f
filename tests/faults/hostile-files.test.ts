import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { hostileFiles } from '../support/hostile-files.ts';

const reader = resolve(import.meta.dirname, '../support/read-alone.ts');
/** Far above what it takes, so that a busy machine fails nothing; a reader that hangs is stopped. */
const mostMilliseconds = 60_000;

let folder: string;
beforeAll(() => {
	folder = mkdtempSync(join(tmpdir(), 'merestone-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function readAlone(file: string) {
	const process_ = spawn(process.execPath, ['--import', 'tsx', reader, file], {
		stdio: ['ignore', 'pipe', 'inherit'],
		timeout: mostMilliseconds,
	});
	let said = '';
	process_.stdout.on('data', (piece: Buffer) => (said += piece.toString()));
	const [code] = await once(process_, 'close');
	expect(code, said).toBe(0);
	return JSON.parse(said) as { status: string; code: string; peakMegabytes: number };
}

// the codes and the 300 MB are the API description's and the intake specification's
it.each(Object.entries(hostileFiles))(
	'%s is refused within 300 MB',
	async (name, [make, code]) => {
		const file = join(folder, name.replaceAll(/\W/g, '-'));
		writeFileSync(file, await make());
		const read = await readAlone(file);
		expect(read).toMatchObject({ status: 'refused', code });
		expect(read.peakMegabytes).toBeGreaterThan(20);
		expect(read.peakMegabytes).toBeLessThan(300);
	},
	2 * mostMilliseconds,
);
