import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { expect, it } from 'vitest';

const root = resolve(import.meta.dirname, '../..');

/** What runs in the browser: pages and components, their state, and `*.worker.ts`. */
function browserFiles(): string[] {
	const folders = ['src/routes', 'src/lib/components', 'src/lib/state', 'src/workers'];
	return folders
		.flatMap((folder) =>
			readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' }).map((file) =>
				join(root, folder, file),
			),
		)
		.filter((file) => /\.(ts|svelte)$/.test(file) && !/\.server\.|\+server\.|\.test\./.test(file))
		.filter((file) => !file.includes('/src/workers/') || file.endsWith('.worker.ts'));
}

/** Packages that only the server needs: they would make every page wait. */
const heavy = new Set(['shapefile', 'pdfkit', 'fontkit', '@resvg/resvg-js']);

/** Files that a file imports at run time, types left out. */
function importsOf(file: string): string[] {
	const text = readFileSync(file, 'utf8');
	const found = text.matchAll(/(?:^|\s)(?:im|ex)port\s+(?!type\b)[^'";]*?from\s+'([^']+)'/g);
	return [...found].flatMap(([, name]) => {
		if (heavy.has(name)) return [name];
		if (!/^\.|^\$lib/.test(name)) return [];
		const path = name.startsWith('$lib')
			? join(root, 'src/lib', name.slice(4))
			: resolve(dirname(file), name);
		const candidates = [path, `${path}.ts`, join(path, 'index.ts')];
		return candidates.filter((one) => existsSync(one) && /\.(ts|svelte)$/.test(one)).slice(0, 1);
	});
}

it('nothing that runs in the browser carries readers of boundary files or writers of pages and pictures', () => {
	const from = new Map<string, string>();
	const queue = browserFiles();
	expect(queue.length).toBeGreaterThan(50);
	for (let file = queue.pop(); file; file = queue.pop()) {
		for (const next of importsOf(file)) {
			if (from.has(next)) continue;
			from.set(next, relative(root, file));
			if (!heavy.has(next)) queue.push(next);
		}
	}
	const readers = [...from].filter(
		([file]) => /boundaries\/readers\//.test(file) || heavy.has(file),
	);
	expect(readers).toEqual([]);
	expect([...from.keys()].some((file) => file.endsWith('boundaries/codec.ts'))).toBe(true);
});
