/** Sheets for tests: real boundaries, a colouring by the plainest rule, an everyday layout. */
import type { Coverage } from '../../src/lib/engines/boundaries/coverage.ts';
import type { SheetInput, SheetLayout } from '../../src/lib/engines/sheet/index.ts';
import { wholeLayout } from '../../src/lib/engines/sheet/layout.ts';
import { topologyOf } from './atlas.ts';
import { bordersOf, coverageFrom, greedyColouring } from './coverage.ts';

const outside = new Set(['02', '15', '60', '66', '69', '72', '78']);

export const layout: SheetLayout = wholeLayout({
	title: 'Corran Pumps: sales districts 2027',
	subtitle: 'As of 1 July 2026',
	paper: 'A4',
	orientation: 'landscape',
	marginMm: 12,
	projection: 'auto',
	labels: true,
	groupColumn: null,
	legend: true,
	scaleBar: true,
	credits: 'Boundaries: U.S. Census Bureau, public domain.',
});

export const inks = [
	{ name: 'Ochre', hex: '#edb552' },
	{ name: 'Chalk', hex: '#e4eaed' },
	{ name: 'Slate blue', hex: '#6490df' },
	{ name: 'Flint', hex: '#8a8574' },
	{ name: 'Moss', hex: '#7fa37a' },
	{ name: 'Clay', hex: '#c97f64' },
	{ name: 'Plum', hex: '#5d3a5d' },
	{ name: 'Sand', hex: '#d8cfa8' },
];

export function statesCoverage(): Coverage {
	return coverageFrom(topologyOf('us-atlas', 'states-10m.json'), 'states', {
		keep: (_, id) => !outside.has(id),
	});
}

export function countiesCoverage(): Coverage {
	return coverageFrom(topologyOf('us-atlas', 'counties-10m.json'), 'counties', {
		keep: (_, id) => !outside.has(id.slice(0, 2)),
	});
}

export function worldCoverage(names?: string[]): Coverage {
	return coverageFrom(topologyOf('world-atlas', 'countries-50m.json'), 'countries', {
		key: (_, id, index) => `${id}-${index}`,
		keep: ({ name }) => !names || names.includes(String(name)),
	});
}

export function sheetOf(coverage: Coverage, changes: Partial<SheetInput> = {}): SheetInput {
	const borders = bordersOf(coverage);
	return {
		coverage,
		borders,
		groups: coverage.keys.map(() => null),
		colouring: greedyColouring(borders, coverage.keys.length),
		inks,
		layout,
		reader: 'typical',
		weak: [],
		issue: 'Draft after edition 3',
		...changes,
	};
}
