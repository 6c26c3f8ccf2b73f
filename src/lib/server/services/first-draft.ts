import type { Draft } from '../../engines/editions/draft.ts';
import { wholeLayout } from '../../engines/sheet/layout.ts';

/** What a sheet starts with: fewest inks, no locks, every border as found, a plain layout. */
export function firstDraft(given: {
	title: string;
	palette: Draft['palette'];
	portrait: boolean;
}): Draft {
	const { id, name, inks } = given.palette;
	return {
		inks: 'fewest',
		palette: { id, name, inks: structuredClone(inks) },
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
			title: given.title,
			subtitle: '',
			paper: 'A4',
			orientation: given.portrait ? 'portrait' : 'landscape',
			marginMm: 10,
			projection: 'auto',
			labels: true,
			groupColumn: null,
			legend: true,
			scaleBar: true,
			credits: '',
		}),
		theme: null,
	};
}
