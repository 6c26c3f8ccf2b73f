import { readdirSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';

const engines = resolve(import.meta.dirname, '../../src/lib/engines');

/** What would make an answer depend on the machine, the moment or chance; a given date does not. */
const changing: Record<string, RegExp> = {
	chance: /\bMath\s*\.\s*random\b|\bgetRandomValues\b|\brandomUUID\b|\brandomBytes\b/,
	'the moment':
		/\bDate\s*\.\s*now\b|\bnew\s+Date\s*(?:\(\s*\)|(?![\w(]))|(?<!new\s+)\bDate\s*\(\s*\)/,
	'a clock': /\bperformance\s*\.|\bhrtime\b|\bconsole\s*\.\s*time|\bTemporal\s*\.\s*Now\b/,
	'a timer': /\bset(?:Timeout|Interval|Immediate)\b|\brequestAnimationFrame\b/,
	'the machine':
		/\bprocess\s*\.|\bnavigator\s*\.|\bhardwareConcurrency\b|\bglobalThis\s*\.\s*process\b/,
	'the language of the machine':
		/\blocaleCompare\s*\(\s*[^,()]*\)|\.toLocale(?:Lower|Upper)Case\(\s*\)/,
};

/** What in a source makes its answers change from run to run, comments left out. */
function changingIn(source: string): string[] {
	const code = source.replace(/\/\*[^]*?\*\/|(?<!:)\/\/.*$/gm, '');
	return Object.keys(changing).filter((name) => changing[name].test(code));
}

describe('the same problem and seed give the same answer in every browser and on the server', () => {
	it('because no engine asks for chance, a clock or the machine it runs on', () => {
		const files = readdirSync(engines, { recursive: true, encoding: 'utf8' }).filter(
			(file) => file.endsWith('.ts') && !file.endsWith('.test.ts'),
		);
		expect(files.length).toBeGreaterThan(200);
		const told = files.flatMap((file) =>
			changingIn(readFileSync(join(engines, file), 'utf8')).map((what) => `${file}: ${what}`),
		);
		expect(told).toEqual([]);
	});

	it('which a planted breach of each kind would not pass', () => {
		const breaches = {
			'const r = Math.random();': 'chance',
			'crypto.getRandomValues(bytes)': 'chance',
			'const now = Date.now();': 'the moment',
			'const now = new Date();': 'the moment',
			'const now = new Date;': 'the moment',
			'const t = performance.now()': 'a clock',
			'setTimeout(stop, 50)': 'a timer',
			'if (navigator.hardwareConcurrency > 2) {}': 'the machine',
			'names.sort((a, b) => a.localeCompare(b))': 'the language of the machine',
		};
		for (const [source, what] of Object.entries(breaches))
			expect(changingIn(source)).toContain(what);
		expect(changingIn('new Date(Date.UTC(1904, 0, 1)) // not Date.now()')).toEqual([]);
	});
});
