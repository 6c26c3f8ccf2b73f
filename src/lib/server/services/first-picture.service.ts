import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readLevel } from '../repositories/display-levels.repository.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { keepFirstPicture, readFirstPicture } from '../repositories/first-pictures.repository.ts';
import { sheetOf } from './draft.service.ts';
import { draftInWords } from './drawing.service.ts';
import { firstPictureTag } from './first-picture-tag.ts';
import { NotFound } from './outcomes.ts';
import { deskSheet } from './sheet.service.ts';
import type { DeskSheet } from '../../schemas/desk.ts';

type Making = Pick<Workshop, 'db' | 'pool'>;

/** Pictures that are being made: whoever else asks waits for the same one. */
const making = new Map<string, Promise<Uint8Array>>();

/**
 * The coarse picture that a large sheet shows while the exact one is drawn, packed with gzip; empty where
 * nothing is drawn. In: the tag that the page was given. It is made where it is not kept yet; a tag of
 * another draft than the present one is not found.
 */
export async function sheetFirstPicture(
	shop: Making,
	member: Member,
	number: number,
	tag: string,
): Promise<Uint8Array> {
	requireAccess(member, 'sheet.read');
	const { boundary_set_id: set } = await sheetOf(shop.db, member, number);
	const kept = await readFirstPicture(shop.db, set, tag);
	if (kept) return kept;
	const sheet = await deskSheet(shop, member, number);
	if (sheet.boundarySet.id !== set || firstPictureTag(sheet) !== tag)
		throw new NotFound('first picture');
	const name = `${set}-${tag}`;
	const made = making.get(name) ?? make(shop, sheet, tag).finally(() => making.delete(name));
	making.set(name, made);
	return made;
}

/** Has the picture of a new large sheet ready before anybody opens it. */
export async function prepareFirstPicture(
	shop: Making,
	team: Member['team'],
	number: number,
): Promise<void> {
	// by nobody's hand: it reads the sheet and keeps what is anyhow made for whoever may see it
	const maker: Member = { team, userId: null, tokenId: null, roles: [], actions: ['sheet.read'] };
	const sheet = await deskSheet(shop, maker, number);
	await make(shop, sheet, firstPictureTag(sheet));
}

async function make(shop: Making, sheet: DeskSheet, tag: string): Promise<Uint8Array> {
	const { draft, boundarySet, regions, borders, theme, lastInks, editions } = sheet;
	const [level] = boundarySet.levels;
	const geometry = level
		? await readLevel(shop.db, boundarySet.id, level.level)
		: await readGeometry(shop.db, boundarySet.id);
	if (!geometry) throw new NotFound('boundary set');
	const issue = draftInWords(editions[0]?.number ?? 0, sheet.revision, new Date(sheet.savedAt));
	const { gzip } = await shop.pool.run('paintFirst', {
		...{ geometry, borders, draft, issue, reader: 'typical' },
		...{ groups: regions.group, colouring: lastInks },
		theme: theme && { ...theme, classes: Int32Array.from(theme.classes) },
	});
	await keepFirstPicture(shop.db, boundarySet.id, tag, gzip);
	return gzip;
}
