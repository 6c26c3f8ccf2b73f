import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import { Forbidden, type Member } from '../../src/lib/server/access/member.ts';
import { saveDraft, saveLayout } from '../../src/lib/server/services/draft.service.ts';
import { Conflict, NotFound, Refused } from '../../src/lib/server/services/outcomes.ts';
import { setAlike } from '../../src/lib/server/services/series.service.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import {
	applyTemplate,
	keepTemplate,
	readTemplates,
	removeTemplate,
	renameTemplate,
	replaceTemplate,
} from '../../src/lib/server/services/templates.service.ts';
import { createMember, createWorkshop, ingest, type TestWorkshop } from '../support/workshop.ts';

let shop: TestWorkshop;
let cartographer: Member;
let analyst: Member;
let stranger: Member;
let first: number;
let second: number;
let id: string;
const plain = { ratio: false, palette: false };

beforeAll(async () => {
	shop = await createWorkshop();
	cartographer = await createMember(shop.db, 'series', 'cartographer');
	analyst = await createMember(shop.db, 'series', 'analyst');
	stranger = await createMember(shop.db, 'strangers', 'cartographer');
	const file = readFileSync('sample-data/tavaroe.geojson');
	const fields = { keyField: 'code', nameField: 'name' };
	const bring = async (name: string) =>
		(await ingest(shop, cartographer, name, file, fields)).sheet ?? 0;
	first = await bring('tavaroe.geojson');
	second = await bring('tavaroe-again.geojson');
});
afterAll(() => shop.close());

const desk = (sheet: number) => deskSheet(shop, cartographer, sheet);
async function lay(sheet: number, change: (layout: Draft['layout']) => Partial<Draft['layout']>) {
	const { draft } = await desk(sheet);
	const result = await saveLayout(shop, cartographer, sheet, change(draft.layout));
	if (result.status !== 'saved') throw new Error('not saved');
	return result.saved;
}
const byName = async (name: string) => {
	const found = (await readTemplates(shop, analyst)).find((one) => one.name === name);
	if (!found) throw new Error(`no template ${name}`);
	return found;
};
const region = { widthMm: 0.2, hex: '#223344', dashMm: [1, 0.5] };

describe('a template', () => {
	it('is kept from a sheet without what is the sheet’s own, once a name whatever its capitals', async () => {
		await lay(first, (layout) => ({
			title: 'The first of them',
			paper: 'A3',
			lines: { ...layout.lines, region },
			collar: { ...layout.collar, legendAt: 'right', legendTitle: 'Its own' },
		}));
		id = await keepTemplate(shop, cartographer, first, {
			name: 'House',
			ratio: false,
			palette: true,
		});
		const { fields, palette, sheets } = await byName('House');
		expect(fields).toMatchObject({
			paper: 'A3',
			'lines.region': region,
			'collar.legendAt': 'right',
		});
		expect(JSON.stringify(fields)).not.toMatch(/first of them|Its own/);
		expect(palette?.inks).toEqual((await desk(first)).draft.palette.inks);
		expect(sheets).toEqual([]);
		const again = keepTemplate(shop, cartographer, second, { name: 'hOUSE', ...plain });
		await expect(again).rejects.toThrow(Refused);
	});

	it('sets another sheet, which is then told with what differs', async () => {
		const { revision, draft } = await desk(second);
		const result = await applyTemplate(shop, cartographer, second, { id, revision });
		if (result.status !== 'saved') throw new Error('not saved');
		const { layout } = result.saved.document;
		expect(layout).toMatchObject({ title: draft.layout.title, paper: 'A3', lines: { region } });
		expect(layout.collar.template).toEqual({ id, name: 'House' });
		expect((await byName('House')).sheets).toMatchObject([{ number: second, differs: [] }]);
		await lay(second, () => ({ marginMm: 3 }));
		const [sheet] = (await byName('House')).sheets;
		expect(sheet.differs).toEqual([{ field: 'marginMm', now: 3, template: draft.layout.marginMm }]);
	});

	it('sets sheets alike again, but never over what somebody else has saved meanwhile', async () => {
		await applyTemplate(shop, cartographer, first, { id, revision: (await desk(first)).revision });
		const { revision: seen } = await lay(first, () => ({ scaleBar: false }));
		const looked = (await byName('House')).sheets.map(({ number, revision }) => ({
			number,
			revision,
		}));
		// a colleague locks a region on the second sheet after this page was loaded
		const now = await desk(second);
		const locked = { ...now.draft, locks: { ...now.draft.locks, '0101': { ink: 1, cost: 1 } } };
		await saveDraft(shop, analyst, second, { revision: now.revision, document: locked });
		const results = await setAlike(shop, cartographer, { id, sheets: looked });
		expect(results).toEqual([
			{ number: first, outcome: 'set', by: null },
			{ number: second, outcome: 'stale', by: 'analyst of series' },
		]);
		expect((await desk(first)).revision).toBe(seen + 1);
		const after = await desk(second);
		expect(after.draft.locks['0101'].ink).toBe(1);
		expect(after.draft.layout.marginMm).toBe(3);
		// looked at again, it is set, and the lock stays
		const fresh = [{ number: second, revision: after.revision }];
		expect(await setAlike(shop, cartographer, { id, sheets: fresh })).toMatchObject([
			{ outcome: 'set' },
		]);
		const { draft } = await desk(second);
		expect(draft.locks['0101'].ink).toBe(1);
		expect((await byName('House')).sheets.flatMap(({ differs }) => differs)).toEqual([]);
		const same = { number: second, revision: (await desk(second)).revision };
		const gone = { number: 999, revision: 1 };
		expect(await setAlike(shop, cartographer, { id, sheets: [same, gone] })).toMatchObject([
			{ outcome: 'same' },
			{ outcome: 'gone' },
		]);
	});

	it('is renamed, replaced and removed by those who saw its last state', async () => {
		const { revision } = await byName('House');
		await renameTemplate(shop, cartographer, { id, revision, name: 'House style' });
		const late = renameTemplate(shop, cartographer, { id, revision, name: 'Too late' });
		await expect(late).rejects.toThrow(Conflict);
		await lay(first, (layout) => ({ collar: { ...layout.collar, legendAt: 'left' } }));
		const state = { id, revision: revision + 1, ...plain };
		await replaceTemplate(shop, cartographer, first, state);
		const { fields, palette, sheets } = await byName('House style');
		expect(fields['collar.legendAt']).toBe('left');
		expect(palette).toBeNull();
		expect(sheets.find(({ number }) => number === second)?.differs).toMatchObject([
			{ field: 'collar.legendAt', now: 'right', template: 'left' },
		]);
		await removeTemplate(shop, cartographer, id);
		expect(await readTemplates(shop, analyst)).toEqual([]);
		expect((await desk(second)).draft.layout.paper).toBe('A3');
	});

	it('has its name alone, also where two are given one at once', async () => {
		const ids = await Promise.all(
			['Left', 'Right'].map((name) => keepTemplate(shop, cartographer, first, { name, ...plain })),
		);
		const same = await Promise.allSettled([
			...ids.map((one) =>
				renameTemplate(shop, cartographer, { id: one, revision: 1, name: 'Middle' }),
			),
			keepTemplate(shop, cartographer, second, { name: 'MIDDLE', ...plain }),
		]);
		const refused = same.flatMap((one) => (one.status === 'rejected' ? [one.reason] : []));
		expect(refused).toHaveLength(2);
		for (const reason of refused) expect(reason).toBeInstanceOf(Refused);
		for (const { id: one, name } of await readTemplates(shop, cartographer))
			if (/left|right|middle/i.test(name)) await removeTemplate(shop, cartographer, one);
	});

	it('is not for those without the right, nor for another team', async () => {
		const mine = await keepTemplate(shop, cartographer, first, { name: 'Ours', ...plain });
		expect(await readTemplates(shop, stranger)).toEqual([]);
		await expect(removeTemplate(shop, stranger, mine)).rejects.toThrow(NotFound);
		const theirs = setAlike(shop, stranger, { id: mine, sheets: [{ number: first, revision: 1 }] });
		await expect(theirs).rejects.toThrow(NotFound);
		const kept = keepTemplate(shop, analyst, first, { name: 'No', ...plain });
		await expect(kept).rejects.toThrow(Forbidden);
		const log = await shop.db
			.selectFrom('activity')
			.select('action')
			.where('action', 'like', 'template.%')
			.execute();
		expect(new Set(log.map(({ action }) => action))).toEqual(
			new Set(
				['kept', 'applied', 'renamed', 'replaced', 'deleted'].map((verb) => `template.${verb}`),
			),
		);
	});
});
