import {
	housePalettes,
	publishedPalettes,
	sameInks,
	type Ink,
	type Palette,
} from '../../engines/palettes/index.ts';
import type { TeamPalette } from '../../schemas/team-palette.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { endApproval, listApprovals } from '../repositories/palette-approvals.repository.ts';
import {
	countPalettes,
	deletePalette,
	findPalette,
	holdPalette,
	insertPalette,
	listPalettes,
	paletteNames,
	updatePalette,
} from '../repositories/palettes.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound, Refused } from './outcomes.ts';
import { paletteView } from './palette-view.ts';

type Reading = Pick<Workshop, 'db'>;
type Inks = { name: string; inks: Ink[] };

/** More palettes than these nobody finds anything in. */
const mostPalettes = 500;

/** The team's own palettes, by name. */
export async function teamPalettes(shop: Reading, member: Member): Promise<TeamPalette[]> {
	requireAccess(member, 'sheet.read');
	const rows = await listPalettes(shop.db, member.team.id);
	const approvals = await listApprovals(shop.db, member.team.id);
	return rows.map((row) => paletteView(row, approvals));
}

/** One of them. */
export async function readPalette(shop: Reading, member: Member, id: string): Promise<TeamPalette> {
	requireAccess(member, 'sheet.read');
	const row = isUuid(id) ? await findPalette(shop.db, member.team.id, id) : undefined;
	if (!row) throw new NotFound('palette');
	return paletteView(row, await listApprovals(shop.db, member.team.id));
}

export async function addPalette(shop: Reading, member: Member, palette: Inks): Promise<string> {
	requireAccess(member, 'palette.edit');
	return shop.db.transaction().execute((trx) => add(trx, member, palette));
}

/** A palette of the house, a published one or one of the team's, as one of the team's own under a new name. */
export async function copyPalette(shop: Reading, member: Member, id: string): Promise<string> {
	requireAccess(member, 'palette.edit');
	return shop.db.transaction().execute(async (trx) => {
		const offered = [...housePalettes, ...publishedPalettes].find((one) => one.id === id);
		const from = offered ?? (await ownForCopy(trx, member, id));
		const taken = await paletteNames(trx, member.team.id);
		return add(trx, member, { ...from, name: freeName(from.name, taken) });
	});
}

async function ownForCopy(trx: Db, member: Member, id: string): Promise<Omit<Palette, 'id'>> {
	const row = isUuid(id) ? await findPalette(trx, member.team.id, id) : undefined;
	if (!row) throw new NotFound('palette');
	const { name, inks, source, licence } = row;
	return { name, inks, source: source ?? undefined, licence: licence ?? undefined };
}

const isUuid = (text: string) => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);

function freeName(name: string, taken: ReadonlySet<string>): string {
	for (let number = 1; ; number++) {
		const tail = number === 1 ? ', copy' : `, copy ${number}`;
		const free = name.slice(0, 120 - tail.length) + tail;
		if (!taken.has(free)) return free;
	}
}

async function add(trx: Db, member: Member, palette: Inks & Partial<Palette>): Promise<string> {
	if ((await countPalettes(trx, member.team.id)) >= mostPalettes)
		throw new Refused(`A team keeps ${mostPalettes} palettes at most. Remove one first.`);
	const { name, inks, source, licence } = palette;
	const entry = { teamId: member.team.id, name, inks, source, licence, createdBy: member.userId };
	const made = await insertPalette(trx, entry);
	if (!made) throw new Refused('The team has a palette of this name already.', 'name');
	const detail = { name, inks: inks.length };
	await record(trx, member, 'palette.added', { kind: 'palette', id: made.id }, detail);
	return made.id;
}

/**
 * Gives a palette other inks or another name. What changes ends its approval. Sheets that use it keep
 * their copy. `revision`: what the change was made from; a later one is told, and nothing is overwritten.
 */
export async function changePalette(
	shop: Reading,
	member: Member,
	id: string,
	{ revision, ...palette }: Inks & { revision: number },
): Promise<void> {
	requireAccess(member, 'palette.edit');
	await shop.db.transaction().execute(async (trx) => {
		const row = await holdPalette(trx, member.team.id, id);
		if (!row) throw new NotFound('palette');
		if (row.revision !== revision)
			throw new Conflict(
				'stale',
				'Somebody else changed this palette meanwhile. Load the page again to see it; nothing was overwritten.',
			);
		if (row.name === palette.name && sameInks(row.inks, palette.inks)) return;
		const source = sourceAfter(row, palette.inks);
		if (!(await updatePalette(trx, id, { ...palette, source })))
			throw new Refused('The team has a palette of this name already.', 'name');
		const ended = await endApproval(trx, id);
		const renamed = row.name === palette.name ? {} : { before: row.name };
		const detail = { name: palette.name, ...renamed, 'approval ended': ended ? 'yes' : 'no' };
		await record(trx, member, 'palette.changed', { kind: 'palette', id }, detail);
	});
}

const changedFrom = 'changed from ';

/** Values that were published are said to be so only while they are the published ones. */
function sourceAfter(
	{ source, inks: before }: { source: string | null; inks: Ink[] },
	inks: Ink[],
) {
	const values = (list: readonly Ink[]) => list.map(({ hex }) => hex).join();
	if (!source || source.startsWith(changedFrom) || values(before) === values(inks)) return source;
	return `${changedFrom}${source}`.slice(0, mostSource);
}
/** characters that the table takes */
const mostSource = 1_000;

/** Sheets that use it keep their copy. */
export async function removePalette(shop: Reading, member: Member, id: string): Promise<void> {
	requireAccess(member, 'palette.edit');
	await shop.db.transaction().execute(async (trx) => {
		const row = await holdPalette(trx, member.team.id, id);
		if (!row || !(await deletePalette(trx, member.team.id, id))) throw new NotFound('palette');
		await record(trx, member, 'palette.deleted', { kind: 'palette', id }, { name: row.name });
	});
}
