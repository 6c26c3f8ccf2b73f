import { describe, expect, it } from 'vitest';
import type { SheetLayout } from '$lib/engines/sheet/layout';
import { blankDraft } from '../../../tests/support/blank-draft';
import { rebase } from './rebase';

const place = (dxMm: number) => ({ dxMm, dyMm: 0, lines: null, short: false });
const block = (text: string) => ({
	...{ text, xMm: 10, yMm: 10, widthMm: 40, sizePt: 8, face: 'sans' as const, ground: false },
});
const empty = blankDraft();
const { layout } = empty;

type Part = 'frame' | 'lettering' | 'lines' | 'collar';
const laidOut = <K extends Part>(part: K, changes: Partial<SheetLayout[K]>) => ({
	...empty,
	layout: { ...layout, [part]: { ...layout[part], ...changes } },
});
const blocks = (...texts: string[]) => laidOut('collar', { blocks: texts.map(block) });

describe('two people at one layout', () => {
	const base = laidOut('lettering', { placed: { a: place(1), b: place(1) } });

	it('may set different names: both stand, and nothing clashes', () => {
		const { draft, both } = rebase(
			base,
			laidOut('lettering', { placed: { a: place(2), b: place(1) }, hidden: ['c'] }),
			laidOut('lettering', { placed: { a: place(1), b: place(3) }, abbreviations: { d: 'D.' } }),
		);
		expect(both).toEqual([]);
		expect(draft.layout.lettering).toMatchObject({
			...{ placed: { a: place(2), b: place(3) }, hidden: ['c'], abbreviations: { d: 'D.' } },
		});
	});

	it('set the same name apart: mine stands, and that one name is told', () => {
		const { draft, both } = rebase(
			base,
			laidOut('lettering', { placed: { a: place(2), b: place(1) } }),
			laidOut('lettering', { placed: { a: place(9), b: place(3) } }),
		);
		expect(both).toEqual(['place of a']);
		expect(draft.layout.lettering.placed).toEqual({ a: place(2), b: place(3) });
	});

	it('may change different parts, lines of different ranks and insets of different groups', () => {
		const look = { widthMm: 0.5, hex: '#000000', dashMm: [] };
		const choice = { place: 'box' as const, cornerMm: null, ratio: null, name: null };
		const lines = rebase(
			empty,
			laidOut('lines', { outer: look }),
			laidOut('lines', { region: look }),
		);
		expect(lines.both).toEqual([]);
		expect(lines.draft.layout.lines).toMatchObject({ outer: look, region: look });
		const insets = rebase(
			empty,
			laidOut('frame', { insetChoices: { north: choice } }),
			laidOut('frame', { insetChoices: { south: choice }, neatLine: true }),
		);
		expect(insets.both).toEqual([]);
		expect(insets.draft.layout.frame).toMatchObject({
			...{ insetChoices: { north: choice, south: choice }, neatLine: true },
		});
	});

	it('may write different text blocks', () => {
		const { draft, both } = rebase(
			blocks('one', 'two'),
			blocks('mine', 'two'),
			blocks('one', 'theirs'),
		);
		expect(both).toEqual([]);
		expect(draft.layout.collar.blocks).toEqual(blocks('mine', 'theirs').layout.collar.blocks);
	});

	it('are told of a text block that both wrote, by its number', () => {
		const { draft, both } = rebase(
			blocks('one', 'two'),
			blocks('mine', 'two'),
			blocks('theirs', 'two'),
		);
		expect(both).toEqual(['text block 1']);
		expect(draft.layout.collar.blocks).toEqual(blocks('mine', 'two').layout.collar.blocks);
	});

	it('lose no text block where one was added meanwhile', () => {
		const texts = ({ draft }: ReturnType<typeof rebase>) =>
			draft.layout.collar.blocks.map(({ text }) => text);
		const added = rebase(blocks('one', 'two'), blocks('mine', 'two'), blocks('one', 'two', 'new'));
		expect(texts(added)).toEqual(['two', 'new', 'mine']);
		expect(added.both).toEqual([]);
		const twice = rebase(blocks('one'), blocks('mine'), blocks('theirs', 'new'));
		expect(texts(twice)).toEqual(['theirs', 'new', 'mine']);
		expect(twice.both).toEqual(['text blocks']);
	});

	it('name lines of one legend each for himself, and clash in the same setting only', () => {
		const lineNames = { outer: '', group: '', region: '' };
		const { draft, both } = rebase(
			empty,
			laidOut('collar', { lineNames: { ...lineNames, outer: 'Border' }, legendTitle: 'Mine' }),
			laidOut('collar', { lineNames: { ...lineNames, group: 'Province' }, legendTitle: 'Theirs' }),
		);
		expect(both).toEqual(['collar legendTitle']);
		expect(draft.layout.collar.lineNames).toEqual({
			...{ outer: 'Border', group: 'Province', region: '' },
		});
	});
});
