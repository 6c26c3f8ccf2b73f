import type { EdgeNeighbours } from '../../engines/boundaries/index.ts';
import type { TieGround } from '../../engines/editions/index.ts';
import type { AdjoiningSheet, SheetTies, TieState } from '../../schemas/ties.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { findDraft, type DraftRow, type SheetRecord } from '../repositories/sheets.repository.ts';
import {
	borderExtents,
	otherSheets,
	type BorderExtent,
	type OtherSheet,
} from '../repositories/ties.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';

/** The sheets that this one could be tied to, those that adjoin first, and how its ties stand. */
export async function sheetTies(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<SheetTies> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const others = await otherSheets(shop.db, member.team.id, sheet.id);
	const draft = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const states: TieState[] = [];
	for (const tie of draft.ties) states.push(await stateOf(shop.db, tie, others));
	return { adjoining: await adjoining(shop.db, sheet, others), states };
}

async function adjoining(
	db: Db,
	sheet: SheetRecord,
	others: OtherSheet[],
): Promise<AdjoiningSheet[]> {
	const sets = [sheet, ...others].map((one) => one.boundary_set_id);
	const extents = await borderExtents(db, [...new Set(sets)]);
	const reach = new Map(extents.map(({ set, box }) => [set, widened(box)]));
	const own = reach.get(sheet.boundary_set_id);
	return others
		.map((other) => {
			const box = reach.get(other.boundary_set_id);
			const meets = own !== undefined && box !== undefined && meet(own, box);
			return { number: other.number, name: other.name, meets, ...followed(other) };
		})
		.sort((p, q) => Number(q.meets) - Number(p.meets) || p.number - q.number);
}

/** What a tie follows: the latest edition, else the draft. */
const followed = ({ edition, edition_revision, revision }: OtherSheet) => ({
	edition,
	revision: edition_revision ?? revision,
});

/** By half as much again on every side, since borders are marked in their middles and the edge has none. */
function widened([west, south, east, north]: BorderExtent['box']): BorderExtent['box'] {
	const [across, up] = [(east - west) / 2 + 0.01, (north - south) / 2 + 0.01];
	return [west - across, south - up, east + across, north + up];
}

const meet = (p: BorderExtent['box'], q: BorderExtent['box']): boolean =>
	p[0] <= q[2] && q[0] <= p[2] && p[1] <= q[3] && q[1] <= p[3];

async function stateOf(
	db: Db,
	tie: { sheet: number; edition: number | null; revision: number },
	others: OtherSheet[],
): Promise<TieState> {
	const other = others.find((one) => one.number === tie.sheet);
	if (!other) return { sheet: tie.sheet, name: null, latest: null, stale: false };
	const latest = followed(other);
	const state = { sheet: tie.sheet, name: other.name, latest };
	if (latest.edition !== tie.edition) return { ...state, stale: true };
	if (latest.edition !== null || latest.revision === tie.revision)
		return { ...state, stale: false };
	const [then, now] = [
		await findDraft(db, other.id, tie.revision),
		await findDraft(db, other.id, latest.revision),
	];
	return { ...state, stale: looksOf(then) !== looksOf(now) };
}

/** What a tie depends on in a draft of the other sheet. */
const looksOf = (draft: DraftRow | undefined): string =>
	draft
		? JSON.stringify([draft.colouring_id, draft.boundary_set_id, documentOf(draft).palette.inks])
		: '';

/**
 * What a tie to another sheet of the team would ask: its regions along the edge with their inks, in the
 * latest edition or, before the first, in the draft. Both sheets are read in a thread.
 */
export async function tieGround(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	to: { sheet: number; within: number },
	asker?: AbortSignal,
): Promise<TieGround> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const target = await sheetOf(shop.db, member, to.sheet);
	if (target.id === sheet.id) throw new Conflict('same-sheet', 'A sheet is not tied to itself.');
	const others = await otherSheets(shop.db, member.team.id, sheet.id);
	const other = others.find((one) => one.id === target.id);
	if (!other) throw new NotFound('sheet');
	const { edition, revision } = followed(other);
	const draft = await draftOf(shop.db, other.id, revision);
	const { inks } = draft;
	if (!inks) throw new Conflict('not-coloured', `Sheet ${to.sheet} is not coloured.`);
	const [here, there] = [
		await geometryOf(shop.db, sheet.boundary_set_id),
		await geometryOf(shop.db, draft.boundary_set_id),
	];
	const input = { here, there, toleranceMetres: to.within };
	const edge = await shop.pool.run('findEdge', input, { signal: asker });
	if (edge.status === 'refused') {
		throw new Unfit('unfit-edge', `The edge cannot be read as one: ${edge.message}`);
	}
	const keys = (await boundaryView(shop.db, sheet.boundary_set_id)).keys;
	const { names } = await boundaryView(shop.db, draft.boundary_set_id);
	return {
		...{ sheet: other.number, name: other.name, edition, revision },
		inks: documentOf(draft).palette.inks,
		...byKey(edge, keys, names, inks),
	};
}

const byKey = (
	{ same, beside }: EdgeNeighbours,
	keys: string[],
	names: string[],
	inks: number[],
): Pick<TieGround, 'same' | 'beside'> => ({
	same: same.map(([a, b]) => ({ key: keys[a], ink: inks[b] })),
	beside: beside.map(({ a, b, metres }) => ({
		...{ key: keys[a], ink: inks[b], metres, other: names[b] },
	})),
});

async function geometryOf(db: Db, setId: string): Promise<Buffer> {
	const geometry = await readGeometry(db, setId);
	if (!geometry) throw new NotFound('boundary set');
	return geometry;
}
