import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import type { Theme } from '../measures/theme.ts';
import { changeSentences, differences, type Comparable } from './index.ts';
import type { FrozenTheme } from './frozen-theme.ts';

const asked: Theme = {
	...{ measure: 'Visits', per: { kind: 'none' }, isRate: true, method: 'quantiles' },
	...{ classes: 2, breaks: [10], rounded: true, ramp: 'viridis', reversed: false, middle: null },
	...{ suppressBelow: 5, title: 'Visits' },
};
const frozen: FrozenTheme = {
	...{ title: 'Visits', note: '', told: 2, figuresAt: '2026-12-01T10:00:00.000Z' },
	inks: ['up to 10', 'over 10', 'no data', 'suppressed'].map((name) => ({ name, hex: '#777777' })),
	classes: { a: 0, b: 1, c: 2 },
};
const blank = blankDraft();
const state = (changes: Partial<Comparable> = {}): Comparable => ({
	...{ boundaries: { digest: 'd' }, colouring: { a: 0, b: 1, c: 0 }, draft: blank },
	...changes,
});
const themed = (theme: Partial<Theme> = {}, shown: Partial<FrozenTheme> = {}) =>
	state({ draft: blankDraft({ theme: { ...asked, ...theme } }), theme: { ...frozen, ...shown } });
const whats = (list: { what: string }[]) => list.map(({ what }) => what);

describe('differences of a theme', () => {
	it('name what of it changed: the measure, the classes, the ramp', () => {
		const found = differences(
			themed(),
			themed({ measure: 'Calls', breaks: [10, 20], classes: 3, ramp: 'cividis' }),
		);
		expect(whats(found.theme)).toEqual(['breaks', 'classes', 'measure', 'ramp']);
		expect(found.same).toBe(false);
		expect(changeSentences(found)).toEqual([
			'Theme changed: limits, number of classes, measure, ramp.',
		]);
	});

	it('tell regions in another class by their ranges, and figures taken over since', () => {
		const later = '2026-12-03T08:00:00.000Z';
		const found = differences(
			themed(),
			themed({}, { classes: { a: 1, b: 1, c: 3 }, figuresAt: later }),
		);
		expect(found.classes).toEqual([
			{ what: 'a', before: 'up to 10', after: 'over 10' },
			{ what: 'c', before: 'no data', after: 'suppressed' },
		]);
		expect(found.figures).toEqual([{ what: 'taken over', before: frozen.figuresAt, after: later }]);
		expect(changeSentences(found)).toEqual([
			'2 regions are in another class.',
			'The figures were taken over again.',
		]);
	});

	it('see a figure that changed within its class where both hold figures, else nothing', () => {
		const [was, is] = [
			{ a: 3, b: 12 },
			{ a: 4, b: 12 },
		];
		const found = differences(themed({}, { figures: was }), themed({}, { figures: is }));
		expect(found.figures).toEqual([{ what: 'figure of a', before: 3, after: 4 }]);
		expect(changeSentences(found)).toEqual(['The figures are others in 1 region.']);
		expect(differences(themed(), themed({}, { figures: is })).figures).toEqual([]);
	});

	it('say that it was put in place of the colouring, or taken away', () => {
		expect(changeSentences(differences(state(), themed()))).toEqual([
			'The sheet shows Visits in place of its colouring.',
		]);
		expect(changeSentences(differences(themed(), state()))).toEqual([
			'The sheet shows its colouring in place of Visits.',
		]);
	});
});

describe('differences of territories', () => {
	const territories = { names: { n: 'North', s: 'South' }, regions: { a: 'n', b: 's' } };

	it('name regions in another territory, and territories with another name', () => {
		const after = {
			names: { n: 'Upland', s: 'South' },
			regions: { a: 's', b: 's', c: 'n' },
		};
		const found = differences(state({ territories }), state({ territories: after }));
		expect(found.territories).toEqual([
			{ what: 'name of n', before: 'North', after: 'Upland' },
			{ what: 'region a', before: 'n', after: 's' },
			{ what: 'region c', before: null, after: 'n' },
		]);
		expect(changeSentences(found)).toEqual([
			'2 regions are in another territory, 1 territory has another name.',
		]);
		expect(differences(state({ territories }), state({ territories })).same).toBe(true);
	});
});

describe('differences of the layout', () => {
	it('are named part by part, and none where an older draft does not say a part yet', () => {
		const { layout } = blank;
		const other = blankDraft({
			layout: { ...layout, title: 'New', collar: { ...layout.collar, legendTitle: 'Inks' } },
		});
		const found = differences(state(), state({ draft: other }));
		expect(whats(found.layout)).toEqual(['collar legendTitle', 'title']);
		expect(changeSentences(found)).toEqual(['Layout changed: collar legend title, title.']);
		const { collar: _, frame: __, ...early } = layout;
		const old = { ...blank, layout: early as typeof layout };
		expect(differences(state({ draft: old }), state()).same).toBe(true);
	});
});
