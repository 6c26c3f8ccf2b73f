import { describe, expect, it } from 'vitest';
import { readDesignTokens } from '../../src/lib/engines/palettes/tokens/index.ts';

/**
 * Examples of the Design Tokens Format Module and Color Module 2025.10 (Design Tokens Community Group),
 * each named by its section. Comments of the examples are left out: the format is JSON without comments.
 */
const srgb = (components: unknown[], hex?: string) => ({
	colorSpace: 'srgb',
	components,
	...(hex ? { hex } : {}),
});
const read = (file: unknown, within?: string) => readDesignTokens(JSON.stringify(file), within);
const hexes = (file: unknown) => {
	const answer = read(file);
	if (answer.status === 'refused') expect.fail(answer.message);
	return Object.fromEntries(answer.inks.map(({ name, hex }) => [name, hex]));
};
const refusal = (file: unknown) => {
	const answer = read(file);
	return answer.status === 'refused' ? answer.message : expect.fail('it was read');
};

describe('Design Tokens Format Module 2025.10', () => {
	it('5.1, example 1: a minimal file', () => {
		expect(hexes({ 'token name': { $type: 'color', $value: srgb([1, 0, 0]) } })).toEqual({
			'token name': '#ff0000',
		});
	});

	it('5.2.2: a type is never guessed from the value', () => {
		expect(refusal({ a: { $value: srgb([1, 0, 0]) } })).toContain('1 token without a type');
	});

	it('5.2.4, example 7: what is deprecated is read and said', () => {
		const answer = read({
			'Button focus': {
				$value: srgb([0.44, 0.753, 1], '#70c0ff'),
				$type: 'color',
				$deprecated: 'Use another.',
			},
		});
		expect(answer).toMatchObject({ inks: [{ name: 'Button focus', hex: '#70c0ff' }] });
		expect(answer).toMatchObject({ notes: ['Button focus is marked as deprecated; it was read.'] });
	});

	it('6.1: a token that holds tokens is an error', () => {
		const inner = { $type: 'color', $value: srgb([0, 0, 0]) };
		expect(refusal({ both: { ...inner, inner } })).toContain('cannot be both');
	});

	it('6.2, example 10: a root token is called by its group', () => {
		const color = (components: number[], hex: string) => ({
			$type: 'color',
			$value: srgb(components, hex),
		});
		expect(
			hexes({
				color: {
					accent: {
						$root: color([0.867, 0, 0], '#dd0000'),
						light: color([1, 0.133, 0.133], '#ff2222'),
						dark: color([0.667, 0, 0], '#aa0000'),
					},
				},
			}),
		).toEqual({ accent: '#dd0000', light: '#ff2222', dark: '#aa0000' });
	});

	it('6.3, example 12: types are inherited, other types left out and said', () => {
		const file = {
			color: {
				$type: 'color',
				primary: { $value: srgb([0, 0.4, 0.8], '#0066cc') },
				secondary: { $value: srgb([0.4, 0.6, 1], '#6699ff') },
				semantic: {
					success: { $value: srgb([0, 0.8, 0.4], '#00cc66') },
					warning: { $type: 'string', $value: 'amber' },
				},
			},
		};
		expect(hexes(file)).toEqual({ primary: '#0066cc', secondary: '#6699ff', success: '#00cc66' });
		expect(read(file)).toMatchObject({
			notes: ['1 token of type string is no colour and is left out.'],
		});
	});

	it.each(['$extends', '$ref'])(
		'6.4, example 13 and 6.4.1: a group extends another by %s',
		(by) => {
			expect(
				hexes({
					button: {
						$type: 'color',
						background: { $value: srgb([0, 0.4, 0.8], '#0066cc') },
						text: { $value: srgb([1, 1, 1], '#ffffff') },
					},
					'button-primary': {
						[by]: by === '$ref' ? '#/button' : '{button}',
						background: { $value: srgb([0.8, 0, 0.4], '#cc0066') },
					},
				}),
			).toEqual({
				'button background': '#0066cc',
				'button text': '#ffffff',
				'button-primary background': '#cc0066',
				'button-primary text': '#ffffff',
			});
		},
	);

	it('6.4.4, examples 16, 17 and 6.7.4, example 23: groups in a circle are an error that names them', () => {
		const color = { $value: srgb([0, 0, 1]), $type: 'color' };
		expect(refusal({ button: { color, secondary: { $extends: '{button}' } } })).toContain(
			'in a circle: button.secondary to button',
		);
		expect(
			refusal({ groupA: { $extends: '{groupB}', color }, groupB: { $extends: '{groupA}' } }),
		).toContain('groupA to groupB to groupA');
		const circle = refusal({
			a: { $extends: '{b}' },
			b: { $extends: '{c}' },
			c: { $extends: '{a}' },
		});
		for (const group of ['a', 'b', 'c']) expect(circle).toContain(group);
	});

	it('6.4.6: a group that extends what is no group is an error', () => {
		const token = { $type: 'color', $value: srgb([0, 0, 1]) };
		expect(refusal({ token, group: { $extends: '{token}' } })).toContain(
			'which is no group of this file',
		);
		expect(refusal({ token, group: { $extends: '{gone}' } })).toContain(
			'which is no group of this file',
		);
	});

	it('6.6.2, example 21 and 7.1: both forms of alias lead to the colour, which is one ink', () => {
		const base = { $type: 'color', $value: srgb([0, 0.4, 0.8], '#0066cc') };
		for (const alias of [
			{ $value: '{base}' },
			{ $ref: '#/base' },
			{ $ref: '#/base/$value', $type: 'color' },
		]) {
			const answer = read({ base, alias });
			expect(answer).toMatchObject({ inks: [{ name: 'base', hex: '#0066cc' }] });
			expect(answer).toMatchObject({
				notes: ['1 alias names a colour that is among the inks already: taken once.'],
			});
		}
	});

	it('7.2.2, example 33: chains of aliases, taken from a group that has none of the colours itself', () => {
		const file = {
			base: { primary: { $value: srgb([0, 0.4, 0.8], '#0066cc'), $type: 'color' } },
			semantic: { brand: { $value: '{base.primary}' }, link: { $value: '{semantic.brand}' } },
		};
		expect(read(file, 'semantic')).toMatchObject({ inks: [{ name: 'brand', hex: '#0066cc' }] });
	});

	it('7.2.3, example 34: aliases in a circle are an error that names them all', () => {
		const said = refusal({ a: { $value: '{b}' }, b: { $value: '{c}' }, c: { $value: '{a}' } });
		expect(said).toBe('Aliases lead round in a circle: a to b to c to a.');
	});

	it('7.3.1, example 35: components that refer to those of another colour', () => {
		const part = (place: number) => ({ $ref: `#/base/blue/$value/components/${place}` });
		expect(
			hexes({
				base: { blue: { $value: srgb([0.2, 0.4, 0.9], '#3366e6'), $type: 'color' } },
				semantic: {
					primary: { $value: srgb([part(0), part(1), 0.7], '#3366b3'), $type: 'color' },
					secondary: { $value: srgb([part(0), part(1), 0.5], '#336680'), $type: 'color' },
				},
			}),
		).toEqual({ blue: '#3366e6', primary: '#3366b3', secondary: '#336680' });
	});
});

describe('Design Tokens Color Module 2025.10', () => {
	// the examples of "Supported color spaces" whose fallback is what their components come to
	it.each([
		['srgb', [1, 0, 1], '#ff00ff'],
		['srgb-linear', [1, 0, 1], '#ff00ff'],
		['lab', [60.17, 93.54, -60.5], '#ff00ff'],
		['xyz-d50', [0.5791, 0.2831, 0.728], '#ff00ff'],
	])('reads hot pink in %s', (colorSpace, components, hex) => {
		const answer = read({
			'Hot pink': { $type: 'color', $value: { colorSpace, components, alpha: 1, hex } },
		});
		expect(answer).toMatchObject({ inks: [{ name: 'Hot pink' }] });
		if (answer.status === 'refused') return;
		const bytes = [1, 3, 5].map((at) => parseInt(answer.inks[0].hex.slice(at, at + 2), 16));
		[255, 0, 255].forEach((byte, i) => expect(Math.abs(bytes[i] - byte)).toBeLessThanOrEqual(1));
	});

	// "HSL": the example's own hex is another colour than its components (CSS: hsl(330 100 50) is #ff0080)
	it('follows the components where hex says another colour, and tells both', () => {
		const $value = { colorSpace: 'hsl', components: [330, 100, 50], alpha: 1, hex: '#ff00ff' };
		expect(read({ 'Hot pink': { $type: 'color', $value } })).toEqual({
			status: 'read',
			inks: [{ name: 'Hot pink', hex: '#ff0080' }],
			notes: [
				'Hot pink is converted from hsl to #ff0080.',
				'Hot pink can be read two ways: its components come to #ff0080, its hex says #ff00ff; the components were read.',
			],
		});
	});

	it('"Using the none keyword": none is read as 0', () => {
		const $value = { colorSpace: 'hsl', components: ['none', 0, 100], alpha: 1, hex: '#ffffff' };
		expect(hexes({ White: { $type: 'color', $value } })).toEqual({ White: '#ffffff' });
	});

	it('"Format": opacity is told, since inks are opaque', () => {
		const $value = { colorSpace: 'srgb', components: [0, 0, 0], alpha: 0.5, hex: '#000000' };
		expect(read({ 'Translucent shadow': { $type: 'color', $value } })).toMatchObject({
			inks: [{ hex: '#000000' }],
			notes: [
				'Translucent shadow has an opacity of 50 %, and inks are opaque: read as #000000; on white paper it would look like #808080.',
			],
		});
	});
});
