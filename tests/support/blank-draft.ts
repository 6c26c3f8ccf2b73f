import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { wholeLayout } from '../../src/lib/engines/sheet/layout.ts';

/** A draft for tests: two inks, nothing decided. */
export const blankDraft = (changes: Partial<Draft> = {}): Draft => ({
	inks: 'fewest',
	palette: {
		id: 'test',
		name: 'Test',
		inks: [
			{ name: 'One', hex: '#eeaa00' },
			{ name: 'Two', hex: '#0055aa' },
		],
	},
	locks: {},
	forbidden: [],
	alike: [],
	apart: [],
	groups: [],
	reserved: [],
	goals: [],
	ties: [],
	pointTouches: false,
	leastMetres: 0,
	waterKm: null,
	struck: [],
	added: [],
	seed: 0,
	layout: wholeLayout({
		title: 'A title',
		subtitle: '',
		paper: 'A4',
		orientation: 'landscape',
		marginMm: 12,
		projection: 'auto',
		labels: true,
		groupColumn: null,
		legend: true,
		scaleBar: true,
		credits: '',
	}),
	theme: null,
	...changes,
});
