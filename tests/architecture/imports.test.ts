import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';

/** Plants one breach a rule and sees that lint refuses it; the same text without it passes. */
const breaches: [name: string, file: string, text: string][] = [
	['an engine knows Svelte', 'src/lib/engines/sheet/planted.ts', `import 'svelte';\n`],
	['an engine knows Kit', 'src/lib/engines/borders/planted.ts', `import '@sveltejs/kit';\n`],
	['an engine knows Node', 'src/lib/engines/graph/planted.ts', `import 'node:fs';\n`],
	['an engine knows SQL', 'src/lib/engines/colouring/planted.ts', `import 'kysely';\n`],
	[
		'an engine reads a later engine',
		'src/lib/engines/graph/planted.ts',
		`import '../colouring/index.ts';\n`,
	],
	[
		'an engine reads the server',
		'src/lib/engines/sheet/planted.ts',
		`import '../../server/access/roles.ts';\n`,
	],
	[
		'a repository calls a service',
		'src/lib/server/repositories/planted.ts',
		`import '../services/sheets.service.ts';\n`,
	],
	['a service knows Kit', 'src/lib/server/services/planted.ts', `import '@sveltejs/kit';\n`],
	['a route speaks SQL', 'src/routes/planted.ts', `import 'kysely';\n`],
	[
		'a component reaches the server',
		'src/lib/components/planted.ts',
		`import '$lib/server/access/roles';\n`,
	],
];

describe('imports point one way', () => {
	let eslint: ESLint;
	beforeAll(() => {
		eslint = new ESLint();
	});

	it.each(breaches)('lint refuses it when %s', async (_name, filePath, text) => {
		const [result] = await eslint.lintText(text, { filePath });
		expect(result.messages.map((message) => message.ruleId)).toContain('no-restricted-imports');
	});

	it('lint accepts an engine that reads an earlier one', async () => {
		const [result] = await eslint.lintText(`import '../graph/index.ts';\n`, {
			filePath: 'src/lib/engines/colouring/planted.ts',
		});
		expect(result.messages).toEqual([]);
	});
});
