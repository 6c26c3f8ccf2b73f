import { requireAccess, type Member } from '../access/member.ts';
import type { BorderFormat } from '../jobs/border-files.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { fileStem } from './drawing.service.ts';
import { NotFound } from './outcomes.ts';

const mediaTypes: Record<BorderFormat, string> = {
	csv: 'text/csv; charset=utf-8',
	col: 'text/plain; charset=utf-8',
};

/** The format that a file of borders is asked for by its ending; `NotFound` for any other name. */
export function borderFormat(file: string): BorderFormat {
	if (file === 'borders.csv') return 'csv';
	if (file === 'borders.col') return 'col';
	throw new NotFound('file');
}

export interface BorderFile {
	name: string;
	mediaType: string;
	bytes: Uint8Array;
}

/** The borders of a sheet's draft as a file: all of them with their standing, or those that count. */
export async function borderFile(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	format: BorderFormat,
	asker: AbortSignal,
): Promise<BorderFile> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const rules = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const { keys, names, borders } = await boundaryView(shop.db, sheet.boundary_set_id);
	const input = { title: sheet.name, keys, names, borders, rules, format };
	return {
		name: `${fileStem(sheet.name)}-borders.${format}`,
		mediaType: mediaTypes[format],
		bytes: await shop.pool.run('writeBorders', input, { signal: asker }),
	};
}
