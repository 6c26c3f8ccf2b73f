import type { Found, Question } from '../../engines/boundaries/index.ts';
import type { RememberedAnswer } from '../../schemas/desk.ts';
import type {
	CarriedRow,
	RecutChange,
	RecutDecision,
	RecutPage,
	RecutRow,
} from '../../schemas/recut.ts';
import { mayDo, requireAccess, type Member } from '../access/member.ts';
import type { Action } from '../access/roles.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findBoundarySet, readGeometry } from '../repositories/boundaries.repository.ts';
import { listRecuts, type RecutNote, type RecutRecord } from '../repositories/recuts.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';
import { personName } from './people.ts';
import { beforeOf } from './recut-before.ts';
import { losses } from './recut-losses.ts';
import { rightsOf } from './sheet.service.ts';
import { hindranceOf, isStale, recutNoteOf, recutOf } from './recut-state.ts';

type Reading = Pick<Workshop, 'db'>;

/** The re-cuts of a sheet but for those that were dropped or cancelled, the newest first. */
export async function sheetRecuts(
	shop: Reading,
	member: Member,
	number: number,
): Promise<RecutRow[]> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	return (await listRecuts(shop.db, sheet.id)).map(noteOf);
}

/** How far a re-cut is, for asking again and again. */
export async function recutStatus(
	shop: Reading,
	member: Member,
	number: number,
	recut: number,
): Promise<RecutRow> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	return noteOf(await recutNoteOf(shop.db, sheet, recut));
}

/** The same with what its page says of the sheet. */
export async function readRecutPage(
	shop: Reading,
	member: Member,
	number: number,
	recut: number,
): Promise<{
	recut: RecutPage;
	sheet: Pick<SheetRecord, 'number' | 'name' | 'revision'>;
	rights: Action[];
}> {
	const opened = await readRecut(shop, member, number, recut);
	const { name, revision } = await sheetOf(shop.db, member, number);
	return { recut: opened, sheet: { number, name, revision }, rights: rightsOf(member) };
}

/** A re-cut with everything that it would change, or has changed. */
export async function readRecut(
	shop: Reading,
	member: Member,
	number: number,
	recut: number,
): Promise<RecutPage> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await recutOf(shop.db, sheet, recut);
	const set = row.to_set ? await findBoundarySet(shop.db, row.to_set) : undefined;
	return {
		...noteOf(row),
		options: row.options as RecutPage['options'],
		question: row.question as unknown as Question | null,
		remembered: (row.remembered ?? []) as RememberedAnswer[],
		refusal: row.refusal as RecutPage['refusal'],
		found: (set?.found ?? null) as unknown as Found | null,
		stale: isStale(sheet, row),
		hindrance: hindranceOf(sheet, row),
		change: row.comparison as unknown as RecutChange | null,
		decisions: row.decisions as unknown as RecutDecision[],
		report: reportFor(member, row),
		loses: await lossesOf(shop.db, member, sheet, row),
	};
}

/** Figures and territories are told to those who may see them. */
const reportFor = (member: Member, row: RecutRecord): CarriedRow[] =>
	((row.report ?? []) as CarriedRow[]).filter(
		({ stage }) => stage === 'draft' || mayDo(member, 'measures.read'),
	);

async function lossesOf(
	db: Db,
	member: Member,
	sheet: SheetRecord,
	row: RecutRecord,
): Promise<string[]> {
	const before = beforeOf(row);
	const isLast = row.state === 'applied' && row.to_set === sheet.boundary_set_id;
	return before && isLast && mayDo(member, 'boundaries.mend') ? losses(db, sheet, before) : [];
}

/** The coverage of one side of a re-cut, with the boundary set's id as its tag: it never changes. */
export async function recutGeometry(
	shop: Reading,
	member: Member,
	number: number,
	recut: number,
	side: 'before' | 'after',
): Promise<{ tag: string; read(): Promise<Buffer> }> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await recutNoteOf(shop.db, sheet, recut);
	const tag = side === 'before' ? row.from_set : row.to_set;
	if (!tag) throw new NotFound('boundary set');
	return {
		tag,
		async read() {
			const bytes = await readGeometry(shop.db, tag);
			if (!bytes) throw new NotFound('boundary set');
			return bytes;
		},
	};
}

const noteOf = (row: RecutNote): RecutRow => ({
	number: row.number,
	kind: row.kind,
	state: row.state,
	fileName: row.file_name,
	words: row.words,
	step: row.step,
	share: row.share,
	createdAt: row.created_at.toISOString(),
	createdBy: personName(row),
	appliedAt: row.applied_at?.toISOString() ?? null,
	appliedBy: personName({ by_name: row.applied_name, by_email: row.applied_email }),
	putBackAt: row.put_back_at?.toISOString() ?? null,
	putBackBy: personName({ by_name: row.back_name, by_email: row.back_email }),
});
