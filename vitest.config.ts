import { svelte } from '@sveltejs/vite-plugin-svelte';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const alias = { $lib: fileURLToPath(new URL('src/lib', import.meta.url)) };

/**
 * Four suites, each started on its own by `npm test`. Engines and published values need nothing;
 * database and faults need DATABASE_URL; journeys need a running product (MERESTONE_URL).
 */
export default defineConfig({
	test: {
		projects: [
			{
				// compiles the state classes, which are written in runes
				plugins: [svelte()],
				resolve: { alias },
				test: {
					name: 'engines',
					include: [
						'src/**/*.test.ts',
						'tests/published/**/*.test.ts',
						'tests/architecture/**/*.test.ts',
					],
					// engines are pure: modules loaded once serve every file, which halves the time
					pool: 'threads',
					isolate: false,
					testTimeout: 60_000,
				},
			},
			{
				resolve: { alias },
				test: {
					name: 'database',
					include: ['tests/database/**/*.test.ts', 'tests/faults/**/*.test.ts'],
					fileParallelism: false,
					testTimeout: 120_000,
					hookTimeout: 120_000,
				},
			},
			{
				test: {
					name: 'journeys',
					include: ['tests/journeys/**/*.test.ts'],
					fileParallelism: false,
					testTimeout: 300_000,
					// a sheet is drawn anew in well under a second, but not beside everything else on two cores
					expect: { poll: { timeout: 15_000 } },
					hookTimeout: 120_000,
				},
			},
		],
	},
});
