import type { Reader } from '../../engines/palettes/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import type { SheetTheme } from '../../engines/sheet/index.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { PaintInput } from '../jobs/paint.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { readGeometry } from '../repositories/boundaries.repository.ts';
import { nextEditionNumber } from '../repositories/editions.repository.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { dayInWords } from './day-in-words.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { NotFound } from './outcomes.ts';
import { groupsOf } from './sheet.service.ts';
import { themeOnSheet, themeTag } from './theme-on-sheet.ts';

export interface SheetSvg {
	/** changes whenever the file would */
	tag: string;
	fileName: string;
	/** draws it; the bytes are packed with gzip */
	paint(signal?: AbortSignal): Promise<Uint8Array>;
}

/** The current draft of a sheet as an SVG file, as one kind of reader sees it. */
export async function draftSvg(
	shop: Workshop,
	member: Member,
	number: number,
	reader: Reader,
): Promise<SheetSvg> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const draft = await draftOf(shop.db, sheet.id, sheet.revision);
	const view = await boundaryView(shop.db, sheet.boundary_set_id);
	const last = (await nextEditionNumber(shop.db, sheet.id)) - 1;
	const issue = draftInWords(last, draft.revision, draft.saved_at);
	const document = documentOf(draft);
	const theme = (await themeOnSheet(shop.db, sheet.id, view, document.theme))?.shown ?? null;
	const tag = `${sheet.id}-${draft.revision}-${last}-${reader}${themeTag(theme)}`;
	return {
		tag,
		fileName: `${fileStem(sheet.name)}-draft-${draft.revision}.svg`,
		paint: (signal) =>
			kept(tag, async () => {
				const { inks } = draft;
				const input = await paintInput(shop.db, view, document, inks, reader, issue, theme);
				return (await shop.pool.run('paintSheet', input, { signal })).gzip;
			}),
	};
}

/** The files painted last, by tag: the page and its download ask for the same one. */
const painted = new Map<string, Uint8Array>();
const mostPainted = 12;

async function kept(tag: string, paint: () => Promise<Uint8Array>): Promise<Uint8Array> {
	const bytes = painted.get(tag) ?? (await paint());
	painted.delete(tag);
	painted.set(tag, bytes);
	for (const oldest of painted.keys()) {
		if (painted.size <= mostPainted) break;
		painted.delete(oldest);
	}
	return bytes;
}

/** Everything the drawing of a draft depends on. */
export async function paintInput(
	db: Db,
	view: BoundaryView,
	draft: Draft,
	colouring: number[] | null,
	reader: Reader,
	issue: string,
	theme: SheetTheme | null,
): Promise<PaintInput> {
	const geometry = await readGeometry(db, view.set.id);
	if (!geometry) throw new NotFound('boundary set');
	const { nameColumn } = draft.layout.lettering;
	return {
		geometry,
		borders: view.borders,
		draft,
		groups: await groupsOf(db, view, draft.layout.groupColumn),
		named: nameColumn === null ? null : await groupsOf(db, view, nameColumn),
		...{ colouring, reader, issue, theme },
	};
}

/** Which draft a sheet shows. In: the number of its last edition, 0 for none. */
export const draftInWords = (last: number, revision: number, savedAt: Date): string =>
	last > 0
		? `Draft after edition ${last}, ${dayInWords(savedAt)}`
		: `Draft ${revision}, ${dayInWords(savedAt)}`;

/** A name as part of a file's name: plain letters and digits, so that every system takes it. */
export const fileStem = (name: string): string =>
	name
		.normalize('NFKD')
		.replace(/\p{M}/gu, '')
		.toLowerCase()
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-+|-+$/g, '')
		.slice(0, 60) || 'sheet';
