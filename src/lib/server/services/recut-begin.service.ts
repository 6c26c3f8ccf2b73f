import type { BoundaryOptions, Mend } from '../../engines/boundaries/index.ts';
import { mostMends, type RereadFields } from '../../schemas/recut-forms.ts';
import { readingFields } from '../../schemas/upload.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';
import { receiveForm } from '../files/multipart.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findBoundarySet, type BoundarySetNote } from '../repositories/boundaries.repository.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import { countOpenRecuts, insertRecut } from '../repositories/recuts.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { sheetOf } from './draft.service.ts';
import { maxUpload, unfitFields } from './intake.service.ts';
import { Conflict, NotFound, Refused, Unfit } from './outcomes.ts';
import { heldSheet, recordRecut } from './recut-held.ts';
import { mendId, requireMendable } from './recut-mends.ts';
import { mendsInWords, readingInWords } from './recut-words.ts';

/** Re-cuts of one sheet that may be open at once; each may hold a file and a boundary set. */
export const mostOpenRecuts = 5;

interface Begun {
	number: number;
}

/** Takes in a form with another file of boundaries for a sheet and has it read and compared by a job. */
export async function beginFileRecut(
	shop: Workshop,
	member: Member,
	number: number,
	request: Request,
): Promise<Begun> {
	requireAccess(member, 'boundaries.upload');
	const { id } = await sheetOf(shop.db, member, number);
	await requireRoom(shop.db, id);
	const form = await receiveForm(request, shop.files, maxUpload());
	try {
		const fields = readingFields.safeParse(form.fields);
		if (!fields.success) throw unfitFields(fields.error.issues);
		if (form.file.bytes === 0) throw new Unfit('empty-file', 'the file is empty');
		const { digest, bytes } = form.file;
		return await shop.db.transaction().execute(async (trx) => {
			const sheet = await heldSheet(trx, member, number);
			await lockDigest(trx, digest);
			const begun = await enter(shop, trx, member, sheet, {
				...{ kind: 'file', file_name: form.fileName, file_bytes: bytes, file_digest: digest },
				options: JSON.stringify(fields.data),
				words: `Takes the boundaries from ${form.fileName}.`,
			});
			await form.file.keep();
			return begun;
		});
	} finally {
		await form.file.discard();
	}
}

/** Has the sheet's own file read in another way: another tolerance, other keys, another layer. */
export async function beginReading(
	shop: Workshop,
	member: Member,
	number: number,
	{ mends, ...fields }: RereadFields,
): Promise<Begun> {
	requireAccess(member, 'boundaries.mend');
	return again(shop, member, number, 'reading', ({ set, options }) => ({
		options: { ...fields, ...(mends === 'keep' && options.mends ? { mends: options.mends } : {}) },
		words: readingInWords(set.file_name, fields),
	}));
}

/** Has the sheet's own file read with these mends after those there are. */
export async function addMends(
	shop: Workshop,
	member: Member,
	number: number,
	mends: Mend[],
): Promise<Begun> {
	requireAccess(member, 'boundaries.mend');
	return again(shop, member, number, 'mends', async ({ set, options, trx }) => {
		const before = options.mends ?? [];
		const standing = new Set(before.map(mendId));
		const fresh = mends.filter((mend) => !standing.has(mendId(mend)));
		if (fresh.length === 0) throw new Refused('These mends stand already.');
		if (before.length + fresh.length > mostMends) {
			throw new Refused(`A file takes ${mostMends} mends at most. Have it mended at its source.`);
		}
		const words = await requireMendable(trx, set.id, before, fresh);
		return { options: { ...options, mends: [...before, ...fresh] }, words: mendsInWords(words) };
	});
}

/** Has the sheet's own file read without one of its mends. */
export async function takeBackMend(
	shop: Workshop,
	member: Member,
	number: number,
	mend: Mend,
): Promise<Begun> {
	requireAccess(member, 'boundaries.mend');
	return again(shop, member, number, 'mends', ({ options }) => {
		const before = options.mends ?? [];
		const place = before.map(mendId).indexOf(mendId(mend));
		if (place < 0) throw new NotFound('mend');
		const words = `Takes back: ${mendsInWords([mend])}`;
		return { options: { ...options, mends: before.toSpliced(place, 1) }, words };
	});
}

interface Present {
	trx: Trx;
	set: BoundarySetNote;
	options: BoundaryOptions;
}
interface Recipe {
	options: BoundaryOptions;
	words: string;
}

/** Another reading of the file that the sheet's present boundaries were read from. */
const again = (
	shop: Workshop,
	member: Member,
	number: number,
	kind: 'reading' | 'mends',
	recipe: (present: Present) => Recipe | Promise<Recipe>,
): Promise<Begun> =>
	shop.db.transaction().execute(async (trx) => {
		const sheet = await heldSheet(trx, member, number);
		const set = await findBoundarySet(trx, sheet.boundary_set_id);
		if (!set) throw new NotFound('boundary set');
		const { options, words } = await recipe({ trx, set, options: set.options });
		return enter(shop, trx, member, sheet, {
			...{ kind, file_name: set.file_name, file_bytes: set.file_bytes },
			...{ file_digest: set.file_digest, options: JSON.stringify(options), words },
		});
	});

type Given = Pick<
	NewRow<'recuts'>,
	'kind' | 'file_name' | 'file_bytes' | 'file_digest' | 'options' | 'words'
>;

async function enter(
	shop: Workshop,
	trx: Trx,
	member: Member,
	sheet: SheetRecord,
	given: Given,
): Promise<Begun> {
	await requireRoom(trx, sheet.id);
	const made = await insertRecut(trx, {
		...given,
		...{ team_id: member.team.id, sheet_id: sheet.id, state: 'waiting' },
		...{ from_set: sheet.boundary_set_id, created_by: member.userId },
	});
	await shop.queue.send(trx, 'recut', { recutId: made.id });
	await recordRecut(trx, member, 'begun', sheet.number, made, { kind: given.kind });
	return { number: made.number };
}

async function requireRoom(db: Db, sheetId: string): Promise<void> {
	if ((await countOpenRecuts(db, sheetId)) < mostOpenRecuts) return;
	throw new Conflict(
		'too-many-open',
		`${mostOpenRecuts} re-cuts of this sheet are open already. Apply or drop one first.`,
	);
}
