import type {
	DeskEdition,
	DeskFinding,
	DeskSheet,
	SheetRow,
	SourceNote,
} from '../../schemas/desk.ts';
import type { BoundaryOptions, Found } from '../../engines/boundaries/index.ts';
import { actions, type Action } from '../access/roles.ts';
import { mayDo, requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	acceptFinding as markAccepted,
	readAttribute,
	readFindings,
	readGeometry,
} from '../repositories/boundaries.repository.ts';
import { listLevels, readLevel } from '../repositories/display-levels.repository.ts';
import { listEditionFiles, listEditions } from '../repositories/editions.repository.ts';
import { exportFiles } from '../repositories/exports.repository.ts';
import { measureFiles } from '../repositories/measures.repository.ts';
import { holdRecutsOf } from '../repositories/recuts.repository.ts';
import {
	deleteSheet,
	holdSheet,
	listSheets,
	renameSheet,
	setsOfDrafts,
} from '../repositories/sheets.repository.ts';
import { record } from './activity.service.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { documentOf, draftOf, inksBefore, namesIn, sheetOf } from './draft.service.ts';
import { measureSummary } from './measures.service.ts';
import { deskColouring } from './outcome-of-colouring.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { personName } from './people.ts';
import { removeSet } from './recut-held.ts';
import { dropUnused } from './stored-files.ts';
import { deskTheme, themeOnSheet } from './theme-on-sheet.ts';

type Reading = Pick<Workshop, 'db'>;

/** The team's sheets, the one saved last first. */
export async function sheetList(shop: Reading, member: Member): Promise<SheetRow[]> {
	requireAccess(member, 'sheet.read');
	const rows = await listSheets(shop.db, member.team.id);
	return rows.map((row) => ({
		number: row.number,
		name: row.name,
		regionCount: row.region_count,
		openFindings: Number(row.open_findings ?? 0),
		inksUsed: row.inks_used,
		lastEdition: row.last_edition,
		savedAt: row.saved_at.toISOString(),
		savedBy: personName(row),
	}));
}

/** Everything a sheet's pages show, but for its geometry. */
export async function deskSheet(shop: Reading, member: Member, number: number): Promise<DeskSheet> {
	requireAccess(member, 'sheet.read');
	const { db } = shop;
	const sheet = await sheetOf(db, member, number);
	const draft = await draftOf(db, sheet.id, sheet.revision);
	const view = await boundaryView(db, sheet.boundary_set_id);
	const document = documentOf(draft);
	return {
		id: sheet.id,
		number: sheet.number,
		name: sheet.name,
		revision: draft.revision,
		savedBy: personName(draft),
		savedAt: draft.saved_at.toISOString(),
		boundarySet: { ...boundarySetNote(view), levels: await listLevels(db, view.set.id) },
		draft: document,
		colouring: deskColouring(namesIn(view, document), draft),
		lastInks: await inksBefore(db, sheet.id, draft),
		regions: {
			key: view.keys,
			name: view.names,
			parts: view.parts,
			areaKm2: view.areasKm2,
			enclaveOf: view.enclaveOf,
			group: await groupsOf(db, view, document.layout.groupColumn),
		},
		borders: view.borders,
		findings: await findingsOf(db, view.set.id),
		editions: await editionsOf(db, sheet.id),
		measures: mayDo(member, 'measures.read') ? await measureSummary(db, sheet) : null,
		theme: deskTheme(await themeOnSheet(db, sheet.id, view, document.theme)),
		rights: rightsOf(member),
	};
}

export const rightsOf = (member: Member): Action[] =>
	actions.filter((action) => mayDo(member, action));

/** How a set was read: what was said about the file, and its mends apart. */
function recipeOf({
	options,
}: BoundaryView['set']): Pick<DeskSheet['boundarySet'], 'options' | 'mends'> {
	const { mends = [], limits: _, ...fields } = options as BoundaryOptions;
	return { options: fields, mends };
}

const boundarySetNote = ({ set }: BoundaryView): Omit<DeskSheet['boundarySet'], 'levels'> => ({
	id: set.id,
	fileName: set.file_name,
	regionCount: set.region_count,
	planar: set.planar,
	planarWitness: set.planar_witness as DeskSheet['boundarySet']['planarWitness'],
	source: set.source as unknown as SourceNote,
	columns: set.columns,
	// how the file lies was shown when it was asked about
	found: set.found && { ...(set.found as unknown as Found), sketch: null },
	...recipeOf(set),
	gapsKm: set.gaps_km,
});

/** The level above of every region, by the column that names it. */
export const groupsOf = async (
	db: Db,
	view: BoundaryView,
	column: string | null,
): Promise<(string | null)[]> =>
	column !== null && view.set.columns.includes(column)
		? readAttribute(db, view.set.id, column)
		: view.keys.map(() => null);

async function findingsOf(db: Db, boundarySetId: string): Promise<DeskFinding[]> {
	const rows = await readFindings(db, boundarySetId);
	return rows.map((row) => ({
		id: row.id,
		code: row.code,
		severity: row.severity,
		message: row.message,
		regions: row.regions,
		at: row.lon === null || row.lat === null ? null : [row.lon, row.lat],
		...(row.offers && { offers: row.offers as DeskFinding['offers'] }),
		...(row.tolerance_metres !== null && { toleranceMetres: row.tolerance_metres }),
		acceptedBy: personName({ by_name: row.accepted_name, by_email: row.accepted_email }),
		acceptedAt: row.accepted_at?.toISOString() ?? null,
	}));
}

export async function editionsOf(db: Db, sheetId: string): Promise<DeskEdition[]> {
	const files = await listEditionFiles(db, sheetId);
	const editions = await listEditions(db, sheetId);
	return editions.map((edition) => ({
		number: edition.number,
		issuedAt: edition.issued_at.toISOString(),
		issuedBy: personName(edition),
		digest: edition.digest,
		note: edition.note,
		files: files
			.filter(({ number }) => number === edition.number)
			.map(({ name, media_type: mediaType, bytes }) => ({ name, mediaType, bytes })),
	}));
}

/**
 * The coverage as stored, whole or at one level of display, under a tag made of the boundary set's id and
 * the level: it never changes.
 */
export async function sheetGeometry(
	shop: Reading,
	member: Member,
	number: number,
	level: number | null = null,
): Promise<{ tag: string; read(): Promise<Buffer> }> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const set = sheet.boundary_set_id;
	return {
		tag: level === null ? set : `${set}-${level}`,
		async read() {
			const bytes =
				level === null ? await readGeometry(shop.db, set) : await readLevel(shop.db, set, level);
			if (!bytes) throw new NotFound(level === null ? 'boundary set' : 'level of display');
			return bytes;
		},
	};
}

export async function acceptFinding(
	shop: Reading,
	member: Member,
	number: number,
	finding: number,
): Promise<void> {
	requireAccess(member, 'findings.accept');
	const sheet = await sheetOf(shop.db, member, number);
	await shop.db.transaction().execute(async (trx) => {
		if (!(await markAccepted(trx, sheet.boundary_set_id, finding, member.userId))) {
			throw new NotFound('open finding');
		}
		const subject = { kind: 'finding', id: String(finding) };
		await record(trx, member, 'finding.accepted', subject, { sheet: sheet.number });
	});
}

export async function nameSheet(
	shop: Reading,
	member: Member,
	number: number,
	name: string,
): Promise<void> {
	requireAccess(member, 'layout.edit');
	const sheet = await sheetOf(shop.db, member, number);
	await shop.db.transaction().execute(async (trx) => {
		await renameSheet(trx, sheet.id, name);
		const subject = { kind: 'sheet', id: sheet.id };
		await record(trx, member, 'sheet.renamed', subject, {
			sheet: number,
			from: sheet.name,
			to: name,
		});
	});
}

/** Deletes a sheet that was never issued, with its re-cuts; editions are kept for good. */
export async function removeSheet(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
): Promise<void> {
	requireAccess(member, 'sheet.delete');
	await shop.db.transaction().execute(async (trx) => {
		const sheet = await holdSheet(trx, member.team.id, number);
		if (!sheet) throw new NotFound('sheet');
		if ((await listEditions(trx, sheet.id)).length > 0) {
			throw new Conflict('issued', 'A sheet with issued editions cannot be deleted.');
		}
		const recuts = await holdRecutsOf(trx, sheet.id);
		const drafted = await setsOfDrafts(trx, sheet.id);
		const tables = await measureFiles(trx, sheet.id);
		const exported = await exportFiles(trx, sheet.id);
		await deleteSheet(trx, sheet.id);
		const subject = { kind: 'sheet', id: sheet.id };
		await record(trx, member, 'sheet.deleted', subject, { sheet: number, name: sheet.name });
		const digests = new Set([...tables, ...exported, ...recuts.digests]);
		for (const set of new Set([...drafted, ...recuts.sets])) {
			for (const digest of await removeSet(trx, set)) digests.add(digest);
		}
		for (const digest of [...digests].sort()) await dropUnused(trx, shop.files, digest);
	});
}
