import type { TerritoriesPreview } from '../../schemas/desk-territories.ts';
import type { ColumnSource, FromColumn, FromScratch } from '../../schemas/territory-forms.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readAttribute } from '../repositories/boundaries.repository.ts';
import { sheetOf } from './draft.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';
import { fromColumn } from './territories-from-column.ts';
import { scratchDraft } from './territories-from-scratch.ts';
import { storeTerritories, type SaveTerritoriesResult } from './territories-store.ts';
import { territoryState, type TerritoryState } from './territory-state.ts';

/** First territories of a sheet: as a column names them, or cut out evenly by the engine. */

/** What a column would give, without saving it. */
export async function previewFromColumn(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	source: ColumnSource,
): Promise<TerritoriesPreview> {
	requireAccess(member, 'territories.edit');
	const state = await territoryState(shop.db, await sheetOf(shop.db, member, number));
	return fromColumn(state.document, state.view.keys, await textsOf(shop, state, source));
}

/** Saves territories and assignment as a column names them, as the next revision. */
export async function assignFromColumn(
	shop: Workshop,
	member: Member,
	number: number,
	{ revision, source }: FromColumn,
): Promise<SaveTerritoriesResult> {
	requireAccess(member, 'territories.edit');
	const state = await stateAt(shop, member, number, revision);
	const texts = await textsOf(shop, state, source);
	const { document } = fromColumn(state.document, state.view.keys, texts);
	return storeTerritories(shop, member, state, document, 'column');
}

/** Saves so many territories of about one size, in place of those there are, as the next revision. */
export async function assignFromScratch(
	shop: Workshop,
	member: Member,
	number: number,
	{ revision, territories, measure, seed }: FromScratch,
): Promise<SaveTerritoriesResult> {
	requireAccess(member, 'territories.edit');
	const state = await stateAt(shop, member, number, revision);
	const document = await scratchDraft(shop, state, { territories, measure, seed });
	return storeTerritories(shop, member, state, document, 'scratch');
}

async function stateAt(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
	revision: number,
): Promise<TerritoryState> {
	const sheet = await sheetOf(shop.db, member, number);
	if (sheet.territory_revision !== revision) {
		throw new Conflict('stale', 'Somebody else saved meanwhile; nothing was changed. Try again.');
	}
	return territoryState(shop.db, sheet);
}

async function textsOf(
	shop: Pick<Workshop, 'db'>,
	{ view, columns, ground }: TerritoryState,
	{ kind, name }: ColumnSource,
): Promise<(string | null)[]> {
	if (kind === 'attribute') {
		if (!view.set.columns.includes(name)) throw new NotFound('column');
		return readAttribute(shop.db, view.set.id, name);
	}
	const words = columns.textColumns.find(({ id }) => id === name);
	if (words?.stale) throw new Unfit('stale-column', 'The column is of an earlier boundary set.');
	if (words) return words.texts;
	const figures = ground.measures.find(({ id }) => id === name)?.values;
	if (figures) return figures.map((value) => (value === null ? null : String(value)));
	throw new NotFound('column');
}
