import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'vite';
import { root } from './files.mjs';
import { sourcesDigest, stampFile } from './sources.mjs';

/**
 * The web application, and beside it each server thread on its own: a thread's file is opened by address
 * when it starts, so it cannot be one of the application's chunks.
 */
async function main(): Promise<void> {
	const digest = sourcesDigest();
	rmSync(stampFile, { force: true });
	buildApplication();
	await buildThreads();
	writeFileSync(stampFile, digest);
}

/** What the build says is of interest only when it fails. */
function buildApplication(): void {
	const program = path.join(root, 'node_modules/vite/bin/vite.js');
	const { status, stdout, stderr } = spawnSync(process.execPath, [program, 'build'], {
		cwd: root,
		env: { ...process.env, NODE_ENV: 'production' },
		encoding: 'utf8',
		maxBuffer: 64 * 1024 * 1024,
	});
	if (status === 0) return;
	process.stderr.write(stdout + stderr);
	throw new Error('vite build failed');
}

/** src/workers/<name>.thread.ts becomes build/workers/<name>.thread.js; packages stay outside. */
async function buildThreads(): Promise<void> {
	const folder = path.join(root, 'src/workers');
	const names = existsSync(folder) ? readdirSync(folder) : [];
	const entries = names.filter((name) => name.endsWith('.thread.ts'));
	if (entries.length === 0) return;
	await build({
		configFile: false,
		root,
		logLevel: 'error',
		resolve: { alias: { $lib: path.join(root, 'src/lib') } },
		build: {
			ssr: true,
			outDir: 'build/workers',
			emptyOutDir: true,
			rollupOptions: {
				input: entries.map((name) => path.join(folder, name)),
				output: { entryFileNames: '[name].js' },
			},
		},
	});
}

await main();
