import { readdirSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

it('shares no code with what makes proof files: of other folders it takes types and the replay', () => {
	const folder = new URL('./', import.meta.url);
	const files = readdirSync(folder).filter((name) => /(?<!\.test)\.ts$/.test(name));
	expect(files.length).toBeGreaterThan(5);
	for (const name of files) {
		const lines = readFileSync(new URL(name, folder), 'utf8').match(/^.*from '.*';$/gm) ?? [];
		for (const line of lines) {
			const path = /from '(.*)'/.exec(line)?.[1] ?? '';
			const typeOnly = /^import type .* from '\.\.\/proof-form\.ts';$/.test(line);
			const fine = path.startsWith('./') || path === '../../../solver/drup.ts' || typeOnly;
			expect(`${name} ${path} ${fine}`).toBe(`${name} ${path} true`);
		}
	}
});
