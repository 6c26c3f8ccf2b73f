import { randomUUID } from 'node:crypto';
import { mkdir, readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';

const dayMilliseconds = 86_400_000;

/** Whether what was last touched then was left by a process that was killed. */
export const isLeftOver = (touched: number | undefined): boolean =>
	touched !== undefined && touched < Date.now() - dayMilliseconds;

/** A folder for bytes on their way: each under a name of its own, none of them needed for long. */
export class Spool {
	constructor(private folder: string) {}

	/** A path for new bytes. */
	async place(): Promise<string> {
		await mkdir(this.folder, { recursive: true, mode: 0o700 });
		return join(this.folder, randomUUID());
	}

	remove(path: string): Promise<void> {
		return rm(path, { force: true });
	}

	/** Removes what is older than a day. */
	async tidy(): Promise<void> {
		await mkdir(this.folder, { recursive: true, mode: 0o700 });
		for (const name of await readdir(this.folder)) {
			const path = join(this.folder, name);
			if (isLeftOver((await stat(path)).mtimeMs)) await this.remove(path);
		}
	}
}
