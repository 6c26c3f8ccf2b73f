import { loadavg } from 'node:os';
import { changes } from './colouring/changes.ts';
import { knownMaps } from './colouring/known-maps.ts';
import { locks } from './colouring/locks.ts';
import { planarVerdict } from './colouring/planarity.ts';
import { sizes } from './colouring/sizes.ts';

const parts = { sizes, 'known-maps': knownMaps, locks, changes, planarity: planarVerdict };

/**
 * The goals of colouring in one run, each record with its goal and whether it was met; `npx tsx
 * tests/benchmarks/colouring.ts [part ...]` runs some. `load` is the work that was going on meanwhile.
 */
export async function* run(names: readonly string[] = Object.keys(parts)) {
	for (const name of names) {
		const part = parts[name as keyof typeof parts];
		if (!part) throw new Error(`There are: ${Object.keys(parts).join(', ')}.`);
		for await (const one of part()) yield { ...one, load: Math.round(loadavg()[0] * 10) / 10 };
	}
}

if (process.argv[1]?.endsWith('colouring.ts')) {
	const names = process.argv.slice(2);
	for await (const one of run(names.length ? names : undefined)) console.log(JSON.stringify(one));
}
