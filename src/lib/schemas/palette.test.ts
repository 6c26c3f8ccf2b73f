import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { newPalette } from './palette.ts';

const read = (inks: string) => newPalette.safeParse({ name: 'Pasted', inks });
const faultOf = (inks: string) => read(inks).error?.issues[0].message;

describe('a palette as it is pasted', () => {
	it.each([
		['#ebb855, #e5ecf0', ['#ebb855', '#e5ecf0'], ['Ink 1', 'Ink 2']],
		['EBB855 Ochre\nChalk: e5ecf0\r\n\n', ['#ebb855', '#e5ecf0'], ['Ochre', 'Chalk']],
		['"#fa0"; (0AF)', ['#ffaa00', '#00aaff'], ['Ink 1', 'Ink 2']],
		['bad\nffffff', ['#bbaadd', '#ffffff'], ['Ink 1', 'Ink 2']],
		['#ebb855 Bad\nBad ebb855', ['#ebb855', '#ebb855'], ['Bad', 'Bad']],
		['Ochre #2 #ebb855\n#ebb855 Ochre #2', ['#ebb855', '#ebb855'], ['Ochre #2', 'Ochre #2']],
		[
			'FFFFFF King’s white\n"King\'s blue" #00f',
			['#ffffff', '#0000ff'],
			['King’s white', "King's blue"],
		],
	])('reads %j', (text, hexes, names) => {
		const { data } = read(text);
		expect(data?.inks.map(({ hex }) => hex)).toEqual(hexes);
		expect(data?.inks.map(({ name }) => name)).toEqual(names);
	});

	it.each(['', 'red', '#12345', '#ebb855, nothing', '#gggggg'])('refuses %j in words', (text) => {
		expect(faultOf(text)).toMatch(/colour/);
	});

	it.each([
		'#zz0000 Bad',
		'Bad #zz0000',
		'#zz0000 ebb855',
		'#zz0000 #ebb855',
		'zz0000 Bad',
		'ebb85 Fee',
	])('takes no other word for the value in %j, and names the line', (line) => {
		expect(faultOf(`#ebb855 Ochre\n${line}`)).toContain(`“${line}” is not a colour`);
	});

	it.each(['#ebb855 #e5ecf0', 'Facade e5ecf0'])('does not guess between two values: %j', (line) => {
		expect(faultOf(line)).toContain('two values');
	});
});

// no source: what a paste means is ours to define; held here is that what is written is read back
describe('an ink written on a line', () => {
	const hexes = fc
		.integer({ min: 0, max: 0xffffff })
		.map((value) => value.toString(16).padStart(6, '0'));
	const words = fc.stringMatching(/^[A-Za-z0-9#’.-]{1,8}('s)?$/);
	const names = fc.array(words, { minLength: 1, maxLength: 5 }).map((list) => list.join(' '));
	const wordsAtEnds = (name: string) => [name.split(' ')[0], name.split(' ').at(-1) ?? ''];
	const marked = (name: string) => wordsAtEnds(name).some((word) => word.startsWith('#'));
	const looksBare = (name: string) => wordsAtEnds(name).some((word) => /^[0-9a-f]+$/i.test(word));

	it('is read back, its value before or after its name', () => {
		fc.assert(
			fc.property(hexes, names, fc.boolean(), (hex, name, before) => {
				fc.pre(!marked(name));
				const { data } = read(before ? `#${hex} ${name}` : `${name} #${hex}`);
				expect(data?.inks).toEqual([{ name, hex: `#${hex}` }]);
			}),
		);
	});

	it('is read back without # where its name is no value', () => {
		fc.assert(
			fc.property(hexes, names, fc.boolean(), (hex, name, before) => {
				fc.pre(!marked(name) && !looksBare(name));
				const { data } = read(before ? `${hex} ${name}` : `${name} ${hex}`);
				expect(data?.inks).toEqual([{ name, hex: `#${hex}` }]);
			}),
		);
	});

	it('is refused where it begins with # and no colour, whatever follows', () => {
		fc.assert(
			fc.property(words, names, (word, name) => {
				fc.pre(!/^[0-9a-f]{3}([0-9a-f]{3})?$/i.test(word));
				expect(faultOf(`#${word} ${name}`)).toContain(`“#${word} ${name}”`);
			}),
		);
	});
});
