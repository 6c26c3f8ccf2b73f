import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { gridCells, landOf } from '../../../../tests/support/recut-lands.ts';
import { matchRegions } from '../../engines/boundaries/recut/index.ts';
import type { Theme } from '../../engines/measures/index.ts';
import { carryOver } from './recut-carry.ts';

const cells = gridCells(2, 4);
const before = await landOf(cells, { a: [0], b: [1], c: [2, 3], d: [4], e: [5], f: [6] });
// by construction: a renamed, b kept, c split, d and e merged, f kept, n new
const after = await landOf(cells, {
	...{ A: [0], n: [7], c: [2], c2: [3], de: [4, 5], f: [6], b: [1] },
});
const match = matchRegions(before, after);

/** no rule here asks who touches whom */
const none = {
	...{ a: new Uint32Array(), b: new Uint32Array(), kind: new Uint8Array() },
	...{ metres: new Float64Array(), at: new Float64Array() },
};

const theme: Theme = {
	...{ measure: 'Visits', per: { kind: 'none' }, isRate: false, method: 'quantiles' },
	...{ classes: 2, breaks: [3], rounded: true, ramp: 'viridis', reversed: false, middle: null },
	...{ suppressBelow: null, title: 'Visits' },
};
const measure = (name: string, values: (number | null)[]) => ({
	id: name,
	name,
	values,
	texts: null,
});

function reported(shown: Partial<Theme>, ...measures: ReturnType<typeof measure>[]) {
	const draft = blankDraft({ theme: { ...theme, ...shown } });
	const standing = { draft, inks: null, territories: null, measures };
	const carried = carryOver(match, standing, { borders: none, columns: [] });
	expect(carried.draft.theme).toEqual(draft.theme);
	const rows = carried.report.filter(({ what }) => what === 'theme');
	return { row: rows[0], rows: rows.length, measures: carried.measures };
}

describe('a theme on new boundaries', () => {
	const visits = measure('Visits', [1, 2, 3, 4, 5, 6]);

	it('says how many regions it tells, and how many lost their figure', () => {
		const { row, rows } = reported({}, visits);
		expect(rows).toBe(1);
		expect(row).toMatchObject({ stage: 'draft', outcome: 'changed' });
		// A, b, f carried and de added up; c and c2 lost theirs, n never had one
		expect(row.words).toBe(
			'The theme of Visits keeps its limits and tells 4 of 7 regions, 1 of them by figures added up from merged regions, 2 have lost theirs and are hatched as no data.',
		);
	});

	it('adds up no rate', () => {
		const { row, measures } = reported({ isRate: true }, visits);
		expect(measures[0].values?.[4]).toBeNull();
		expect(row.words).toContain('tells 3 of 7 regions, 3 have lost theirs');
	});

	it('counts what it is divided by', () => {
		const per = { kind: 'measure', measure: 'People', times: 1 } as const;
		const { row } = reported({ per }, visits, measure('People', [10, null, 30, 40, 50, 60]));
		expect(row.words).toContain('tells 3 of 7 regions');
	});

	it('says that it has no figures where its measure did not stand on these boundaries', () => {
		const { row } = reported({ measure: 'Calls' }, visits);
		expect(row).toMatchObject({ outcome: 'dropped' });
		expect(row.words).toContain('The theme of Calls stands, but has no figures');
	});

	it('is not told of where the sheet shows its colouring', () => {
		const draft = blankDraft();
		const standing = { draft, inks: null, territories: null, measures: [visits] };
		const { report } = carryOver(match, standing, { borders: none, columns: [] });
		expect(report.map(({ what }) => what)).toEqual(['measure']);
	});
});
