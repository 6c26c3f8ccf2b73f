import { parse as parseColour } from 'culori';
import fc from 'fast-check';
import { parseCss } from 'svelte/compiler';
import { describe, expect, it } from 'vitest';
import { hatchedInks, hostileNames, sourceOf } from '../../../../../tests/support/export-source.ts';
import { readDesignTokens } from '../../palettes/tokens/index.ts';
import type { Ink } from '../../palettes/palette.ts';
import { exportCss } from './css.ts';
import { exportTokens } from './tokens.ts';

const { about } = sourceOf();
const text = (bytes: Uint8Array) => new TextDecoder('utf-8', { fatal: true }).decode(bytes);
const hostile: Ink[] = hostileNames.map((name, i) => ({
	name,
	hex: `#${(i * 1_111_111).toString(16).padStart(6, '0')}`,
}));

interface Token {
	$value: { colorSpace: string; components: number[]; alpha: number; hex: string };
	$description: string;
}

const tokensOf = (inks: Ink[]) => {
	const { inks: group, ...rest } = JSON.parse(text(exportTokens(inks, about)));
	const { $type, ...tokens } = group as { $type: string } & Record<string, Token>;
	return { $type, rest, tokens: Object.entries(tokens) as [string, Token][] };
};

/**
 * Rules of the Design Tokens Format Module 2025.10: 5.1.1 names (no leading `$`, no `{`, `}`, `.`), 5.2
 * `$value`, 5.2.2 `$type`, 5.2.1 `$description`; and of the Color Module 2025.10: `colorSpace`, as many
 * `components` as the space has, each in its range, `alpha` from 0 to 1, `hex` of six digits.
 */
function faults(inks: Ink[]): string[] {
	const { $type, tokens } = tokensOf(inks);
	return [
		...($type === 'color' ? [] : [`type ${$type}`]),
		...(tokens.length === inks.length ? [] : [`${tokens.length} of ${inks.length} tokens`]),
		...tokens.flatMap(([name, { $value: value, $description: said }], i) => [
			...(/^\$|[{}.]/.test(name) || name === '' ? [`name ${name}`] : []),
			...(value.colorSpace === 'srgb' ? [] : ['space']),
			...(value.components.length === 3 ? [] : ['components']),
			...value.components.filter((one) => !(one >= 0 && one <= 1)).map(String),
			...(value.alpha === 1 ? [] : ['alpha']),
			...(value.hex === inks[i].hex ? [] : [value.hex]),
			...(typeof said === 'string' && said ? [] : ['description']),
		]),
	];
}

describe('Design Tokens', () => {
	it('keep the rules of the format, in the order of the legend', () => {
		expect(faults(hatchedInks)).toEqual([]);
		expect(faults(hostile)).toEqual([]);
		expect(tokensOf(hatchedInks).tokens.map(([name]) => name)).toEqual(
			hatchedInks.map(({ name }) => name),
		);
	});

	it('come back through the reader of palettes, which is no part of this engine', () => {
		const read = readDesignTokens(text(exportTokens(hatchedInks, about)));
		if (read.status === 'refused') throw new Error(read.message);
		expect(read.inks.map(({ hex }) => hex)).toEqual(hatchedInks.map(({ hex }) => hex));
	});

	it('have components that are the hex digits, by culori 4.0.2', () => {
		for (const [, { $value: value }] of tokensOf(hatchedInks).tokens) {
			const colour = parseColour(value.hex) as { r: number; g: number; b: number };
			[colour.r, colour.g, colour.b].forEach((one, i) =>
				expect(value.components[i]).toBeCloseTo(one, 4),
			);
		}
	});

	it('never share a name, whatever the inks are called', () => {
		const name = fc.oneof(
			fc.string({ unit: 'binary', maxLength: 20 }),
			fc.constantFrom('a', '1', '$'),
		);
		fc.assert(
			fc.property(fc.array(name, { minLength: 1, maxLength: 12 }), (names) => {
				const inks = names.map((one) => ({ name: one, hex: '#123456' }));
				expect(faults(inks)).toEqual([]);
				expect(exportTokens(inks, about)).toEqual(exportTokens(inks, about));
			}),
		);
	});
});

/** Declarations of the file's only rule, by the parser of svelte 5.57.3. */
function declarations(css: string): Map<string, string> {
	const { children } = parseCss(css);
	const rules = children.filter(({ type }) => type === 'Rule');
	expect(rules.length).toBe(1);
	const [rule] = rules as Extract<(typeof children)[number], { type: 'Rule' }>[];
	expect(css.slice(rule.prelude.start, rule.prelude.end)).toBe(':root');
	const said = rule.block.children.map((one) => {
		if (one.type !== 'Declaration') throw new Error(one.type);
		return [one.property, one.value] as const;
	});
	expect(new Set(said.map(([property]) => property)).size).toBe(said.length);
	return new Map(said);
}

/** Svelte's parser keeps comments out of values only where they stand alone. */
const bare = (value: string) => value.replace(/\/\*[\s\S]*?\*\//g, '').trim();

describe('CSS', () => {
	it('says every ink by its number, and by name where there is one', () => {
		const said = declarations(text(exportCss(hatchedInks, about)));
		hatchedInks.forEach(({ hex }, ink) => expect(bare(said.get(`--ink-${ink + 1}`)!)).toBe(hex));
		expect(said.get('--ink-slate-blue')).toBe('var(--ink-3)');
	});

	it('lets no name out of its comment', () => {
		const name = fc.oneof(
			fc.string({ unit: 'binary', maxLength: 20 }),
			fc.string({ unit: fc.constantFrom('*', '/', '}', ';', '\\', '"', '\n', 'a'), maxLength: 20 }),
			fc.constantFrom(...hostileNames),
		);
		fc.assert(
			fc.property(fc.array(name, { minLength: 1, maxLength: 12 }), name, (names, title) => {
				const inks = names.map((one, i) => ({ name: one, hex: `#0000${(16 + i).toString(16)}` }));
				const said = declarations(text(exportCss(inks, { ...about, title })));
				for (const [property, value] of said) {
					expect(property).toMatch(/^--ink-[a-z0-9-]+$/);
					expect(bare(value)).toMatch(/^(#[0-9a-f]{6}|var\(--ink-\d+\))$/);
				}
				expect([...said.keys()].filter((one) => /^--ink-\d+$/.test(one)).length).toBe(inks.length);
			}),
		);
	});
});
