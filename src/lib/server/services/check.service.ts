import { readingFields } from '../../schemas/upload.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Answer } from '../api/answer.ts';
import { unfit } from '../api/read-json.ts';
import { receiveForm } from '../files/multipart.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { maxUpload } from './intake.service.ts';

/** A check that takes longer is stopped. Budgets are in steps; this only guards the machine. */
const longestMilliseconds = 300_000;

const until = (asker: AbortSignal): AbortSignal =>
	AbortSignal.any([asker, AbortSignal.timeout(longestMilliseconds)]);

/** Checks that store nothing. Each runs in a thread, and ends when the asker goes away. */
export const checkColouring = (
	{ checks }: Pick<Workshop, 'checks'>,
	body: Uint8Array,
	asker: AbortSignal,
): Promise<Answer> => checks.run('checkColouringJson', body, { signal: until(asker) });

export const checkPalette = (
	{ checks }: Pick<Workshop, 'checks'>,
	body: Uint8Array,
	asker: AbortSignal,
): Promise<Answer> => checks.run('checkPaletteJson', body, { signal: until(asker) });

export const checkProof = (
	{ checks }: Pick<Workshop, 'checks'>,
	body: Uint8Array,
	asker: AbortSignal,
): Promise<Answer> => checks.run('checkProofJson', body, { signal: until(asker) });

export const checkTerritories = (
	{ checks }: Pick<Workshop, 'checks'>,
	body: Uint8Array,
	asker: AbortSignal,
): Promise<Answer> => checks.run('checkTerritoriesJson', body, { signal: until(asker) });

export async function checkBoundaries(
	{ checks, files }: Pick<Workshop, 'checks' | 'files'>,
	request: Request,
): Promise<Answer> {
	const form = await receiveForm(request, files, maxUpload());
	try {
		const options = readingFields.safeParse(form.fields);
		if (!options.success) throw unfit(options.error.issues);
		const input = { path: form.file.path, fileName: form.fileName, options: options.data };
		return await checks.run('checkBoundariesFile', input, { signal: until(request.signal) });
	} finally {
		await form.file.discard();
	}
}

/** The borders that bind on a sheet, written out for programs. */
export async function sheetBordersAnswer(
	shop: Pick<Workshop, 'db' | 'checks'>,
	member: Member,
	number: number,
	asker: AbortSignal,
): Promise<Answer> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const draft = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const { keys, borders } = await boundaryView(shop.db, sheet.boundary_set_id);
	return shop.checks.run('sheetBordersJson', { keys, borders, draft }, { signal: until(asker) });
}
