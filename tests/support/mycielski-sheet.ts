import { colour, type ColouringResult } from '../../src/lib/engines/colouring/index.ts';
import type { Draft } from '../../src/lib/engines/editions/draft.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import {
	insertColouring,
	insertDraft,
} from '../../src/lib/server/repositories/sheets.repository.ts';
import { deskSheet } from '../../src/lib/server/services/sheet.service.ts';
import { mycielski, type EdgeList } from './named-graphs.ts';
import { plainFor } from './planner.ts';
import { createMember, type TestWorkshop } from './workshop.ts';

/**
 * A row of fields whose lines do not count, joined by hand as Mycielski's graph is (Mycielski 1955, Sur le
 * coloriage des graphes): no three border each other, and yet `inks` inks are needed. With five that takes
 * an engine a moment to show, with six some seconds.
 */
export interface MycielskiSheet {
	sheet: number;
	sheetId: string;
	analyst: Member;
	designer: Member;
	draft: Draft;
	keys: string[];
}

/** Makes it with a colouring that leaves something open, as if the first try had been cut short. */
export async function mycielskiSheet(
	shop: TestWorkshop,
	slug: string,
	needed: number,
	asked: Draft['inks'],
	found: (known: Coloured) => ColouringResult,
): Promise<MycielskiSheet> {
	const cartographer = await createMember(shop.db, slug, 'cartographer');
	const planner = await createMember(shop.db, slug, 'planner');
	const analyst = await createMember(shop.db, slug, 'analyst');
	const designer = await createMember(shop.db, slug, 'designer');
	const { regions, borders } = needing(needed);
	const size = { rows: 1, columns: regions };
	const { sheet, sheetId, keys } = await plainFor(shop, { cartographer, planner }, size);
	const made = { sheet, sheetId, analyst, designer, keys };
	const { draft: first } = await deskSheet(shop, analyst, sheet);
	const draft: Draft = {
		...{ ...first, inks: asked, leastMetres: 1_000_000 },
		added: Array.from(borders.a, (a, i) => ({
			...{ a: keys[a], b: keys[borders.b[i]], reason: 'joined for the test' },
		})),
	};
	const known = await colour({ regions, borders, inks: needed, effort: 'quick' });
	if (known.status !== 'coloured') throw new Error('a quick try finds as many inks as are needed');
	await store(shop, made, draft, found(known));
	return { ...made, draft };
}

export type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/** Mycielski's graph that needs so many inks: made from a pair of regions, each step needs one more. */
function needing(inks: number): EdgeList {
	let graph: EdgeList = { regions: 2, borders: { a: [0], b: [1] } };
	for (let n = 2; n < inks; n++) graph = mycielski(graph);
	return graph;
}

async function store(
	shop: TestWorkshop,
	{ sheet, sheetId, analyst }: Pick<MycielskiSheet, 'sheet' | 'sheetId' | 'analyst'>,
	document: Draft,
	result: ColouringResult,
): Promise<void> {
	const { revision } = await deskSheet(shop, analyst, sheet);
	const isColoured = result.status === 'coloured';
	await shop.db.transaction().execute(async (trx) => {
		await insertDraft(trx, {
			...{ sheetId, revision: revision + 1, document, savedBy: analyst.userId },
			colouringId: isColoured
				? await insertColouring(trx, sheetId, { ...result, inks: result.colouring })
				: null,
			explanation: isColoured ? null : result,
		});
	});
}
