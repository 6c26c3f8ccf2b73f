import { readFileSync } from 'node:fs';
import { wcagContrast } from 'culori';
import { describe, expect, it } from 'vitest';

/**
 * WCAG 2.2, success criteria 1.4.3 (text 4.5:1) and 1.4.11 (outlines of controls and focus 3:1),
 * computed by culori from the values in app.css.
 */
const css = readFileSync(new URL('../../app.css', import.meta.url), 'utf8');

function tokensOf(selector: string): Record<string, string> {
	const start = css.indexOf(`${selector} {`);
	expect(start, selector).toBeGreaterThanOrEqual(0);
	const block = css.slice(start, css.indexOf('}', start));
	return Object.fromEntries(
		[...block.matchAll(/--booth-(\w+): (#[0-9a-f]{6})/g)].map(([, name, hex]) => [name, hex]),
	);
}

const standard = tokensOf(':root');
const booths = {
	standard,
	'light table': { ...standard, ...tokensOf(":root[data-booth='light-table']") },
	dark: { ...standard, ...tokensOf(":root[data-booth='dark']") },
	'dark by preference': {
		...standard,
		...tokensOf(":root:not([data-booth='light-table'], [data-booth='standard'])"),
	},
};

describe.each(Object.entries(booths))('booth: %s', (_, tokens) => {
	const surfaces = ['ground', 'panel', 'bar'] as const;

	it.each(surfaces)('text and links can be read on the %s', (surface) => {
		for (const voice of ['ink', 'soft', 'blue'])
			expect(wcagContrast(tokens[voice], tokens[surface]), voice).toBeGreaterThanOrEqual(4.5);
	});

	it('outlines of controls stand out from panel and bar', () => {
		for (const surface of ['panel', 'bar'])
			expect(wcagContrast(tokens.edge, tokens[surface])).toBeGreaterThanOrEqual(3);
	});

	it('greys have no hue', () => {
		for (const [name, hex] of Object.entries(tokens)) {
			if (name === 'blue') continue;
			expect(new Set([hex.slice(1, 3), hex.slice(3, 5), hex.slice(5, 7)]).size, name).toBe(1);
		}
	});
});
