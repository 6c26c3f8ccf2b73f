import { expect, it } from 'vitest';
import { classMethods, type Theme } from '$lib/engines/measures/theme';
import { theme as themeSchema } from '$lib/schemas/theme';
import { autoTitle, inSentence, pairWords, themeStage, untoldWords } from './theme-words';

const per = (times: number, measure = 'people') => ({ kind: 'measure', measure, times }) as const;

it('the heading of a legend says figure, unit and what it is divided by', () => {
	const titles = [
		{ kind: 'none' } as const,
		{ kind: 'area' } as const,
		per(1),
		per(1000),
		per(0.5),
	];
	expect(titles.map((one) => autoTitle({ measure: 'Visits', per: one }, 'h'))).toEqual([
		...['Visits, h', 'Visits, h per km²', 'Visits, h per people'],
		...['Visits, h per 1,000 people', 'Visits, h per 0.5 people'],
	]);
});

it('a heading made of the longest names can be saved', () => {
	const measure = 'm'.repeat(200);
	const theme: Theme = {
		...{ measure, per: per(1000, 'd'.repeat(200)), isRate: false, method: classMethods[0] },
		...{ classes: 5, breaks: [], rounded: true, ramp: 'viridis', reversed: false, middle: null },
		...{ suppressBelow: null, title: '' },
	};
	const title = autoTitle(theme, 'unit');
	expect(themeSchema.safeParse({ ...theme, title }).success).toBe(true);
});

it('a theme that gives no region a class says why', () => {
	const words = (...classes: number[]) =>
		untoldWords({ classes: Int32Array.from(classes), told: 3 });
	expect(words(0, 3, 4)).toBe('');
	expect(words(3, 3)).toMatch(/^No region has a figure/);
	expect(words(4, 4)).toMatch(/every count is suppressed/);
	expect(words(3, 4)).toMatch(/missing or suppressed/);
});

it('a difference that misses what is asked is not rounded up to it', () => {
	const pair = { a: 0, b: 1, next: true, found: 9.98, asked: 10, severity: 'warning' } as const;
	expect(pairWords({ ...pair, reader: 'deutan' })).toBe(
		'Classes 1 and 2 differ least: 9.9, 10 asked',
	);
});

it('the docket tells that classes look alike, and where that is put right', () => {
	const well = { title: 'Visits', told: 5, untold: 0, trouble: null, holds: true };
	const stage = (alike: boolean) => themeStage({ ...well, misleads: false, alike });
	expect(stage(false)).toMatchObject({ mark: 'clear' });
	expect(stage(true).mark).toBe('warning');
	expect(stage(true).words.at(-1)).toEqual({ text: 'Some classes look alike', to: '#classes' });
});

it('a sentence about inks is one about classes', () => {
	expect(inSentence('Every reader can tell apart all inks that touch')).toBe(
		'every reader can tell apart all classes that touch',
	);
	expect(inSentence('No inks touch yet')).toBe('no classes touch yet');
});
