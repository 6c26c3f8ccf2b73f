import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import ts from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

/** Engines in the order in which they may know each other: each may import only those before it. */
export const engineOrder = [
	'geometry',
	'graph',
	'colour',
	'solver',
	'borders',
	'boundaries',
	'palettes',
	'colouring',
	'measures',
	'territories',
	'sheet',
	'editions',
	'exports',
];

const framework = ['svelte', 'svelte/*', '@sveltejs/*', '$app/*', '$env/*', '$lib', '$lib/*'];
const sql = ['kysely', 'pg', 'pg-boss', '@auth/*'];
const node = ['node:*', 'fs', 'path', 'os', 'worker_threads', 'child_process', 'crypto'];

/** @param {string[]} group @param {string} message */
const forbid = (group, message) => ({
	'no-restricted-imports': ['error', { patterns: [{ group, message }] }],
});

/** One block for each engine, so that the message names the engine that reached too far. */
const engineBlocks = engineOrder.map((engine, place) => ({
	files: [`src/lib/engines/${engine}/**/*.ts`],
	ignores: ['**/*.test.ts'],
	rules: {
		'no-restricted-imports': [
			'error',
			{
				patterns: [
					{
						group: [...framework, ...sql, ...node],
						message: 'Engines are pure: values in, values out.',
					},
					// the last engine may import all others, and an empty group is refused
					...(place + 1 < engineOrder.length
						? [
								{
									group: engineOrder.slice(place + 1).map((later) => `**/${later}/**`),
									message: `The ${engine} engine may import only the engines before it.`,
								},
							]
						: []),
					{
						group: ['**/server/**', '**/components/**', '**/state/**', '**/routes/**', '**/ops/**'],
						message: 'Engines import engines only.',
					},
				],
			},
		],
	},
}));

export default ts.config(
	{ ignores: ['build/', '.svelte-kit/', '.data/', 'node_modules/', 'coverage/'] },
	js.configs.recommended,
	...ts.configs.recommended,
	...svelte.configs.recommended,
	{ languageOptions: { globals: { ...globals.browser, ...globals.node } } },
	{
		files: ['**/*.svelte', '**/*.svelte.ts'],
		languageOptions: {
			parserOptions: { parser: ts.parser, extraFileExtensions: ['.svelte'], svelteConfig },
		},
	},
	{
		rules: {
			'no-undef': 'off',
			'svelte/no-navigation-without-resolve': 'off',
			'@typescript-eslint/no-unused-vars': [
				'error',
				{ argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
			],
			'no-empty': ['error', { allowEmptyCatch: false }],
		},
	},
	...engineBlocks,
	{
		files: ['src/lib/server/repositories/**/*.ts'],
		rules: forbid(
			['**/services/**', '**/engines/**', '**/routes/**', '@sveltejs/*', 'svelte', '$app/*'],
			'Repositories speak SQL and nothing else.',
		),
	},
	{
		files: ['src/lib/server/services/**/*.ts', 'src/lib/server/jobs/**/*.ts'],
		rules: forbid(
			['**/routes/**', '@sveltejs/kit', 'svelte', '$app/*', '**/components/**', '**/state/**'],
			'Services know nothing of pages.',
		),
	},
	{
		files: ['src/lib/components/**/*', 'src/lib/state/**/*'],
		rules: forbid(
			['**/server/**', 'kysely', 'pg'],
			'Components and state reach engines and schemas only.',
		),
	},
	{
		files: ['src/routes/**/*'],
		rules: forbid(
			['**/server/repositories/**', 'kysely', 'pg'],
			'Routes ask services; only repositories speak SQL.',
		),
	},
);
