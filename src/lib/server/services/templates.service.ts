import type { Draft } from '../../engines/editions/draft.ts';
import { setByTemplate, templateDiffers } from '../../engines/editions/templates.ts';
import { wholeLayout } from '../../engines/sheet/layout.ts';
import { templateOf } from '../../engines/sheet/layout/template.ts';
import type { TemplateView } from '../../schemas/template.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { TemplateContent } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	deleteTemplate,
	findTemplate,
	holdTemplate,
	holdTemplateNames,
	insertTemplate,
	listTemplates,
	sheetsByTemplate,
	templateNamed,
	updateTemplate,
} from '../repositories/templates.repository.ts';
import { record } from './activity.service.ts';
import { documentOf, draftOf, saveDraft, sheetOf, type SaveResult } from './draft.service.ts';
import { Conflict, NotFound, Refused } from './outcomes.ts';

type Reading = Pick<Workshop, 'db'>;
/** What goes into a template beside the layout. */
export interface Shared {
	ratio: boolean;
	palette: boolean;
}

const mostTemplates = 200;

/** The team's templates by name, each with the sheets that were set by it and how these differ now. */
export async function readTemplates(shop: Reading, member: Member): Promise<TemplateView[]> {
	requireAccess(member, 'sheet.read');
	const rows = await listTemplates(shop.db, member.team.id);
	const sheets = rows.length ? await sheetsByTemplate(shop.db, member.team.id) : [];
	return rows.map(({ id, name, revision, updated_at, fields, ratio, palette }) => ({
		...{ id, name, revision, fields, ratio, palette },
		updatedAt: updated_at.toISOString(),
		sheets: sheets
			.filter(({ template }) => template === id)
			.map((sheet) => ({
				...{ number: sheet.number, name: sheet.name, revision: sheet.revision },
				differs: templateDiffers(
					{ layout: wholeLayout(sheet.layout), palette: sheet.palette },
					{ fields, ratio, palette },
				),
			})),
	}));
}

/** Keeps the layout of a sheet, as it was saved last, as a template of the team. */
export async function keepTemplate(
	shop: Reading,
	member: Member,
	number: number,
	{ name, ...shared }: Shared & { name: string },
): Promise<string> {
	requireAccess(member, 'layout.edit');
	const content = await contentOf(shop.db, member, number, shared);
	return shop.db.transaction().execute(async (trx) => {
		await holdTemplateNames(trx, member.team.id);
		if ((await listTemplates(trx, member.team.id)).length >= mostTemplates)
			throw new Refused(`A team keeps ${mostTemplates} templates at most. Remove one first.`);
		const entry = { ...content, teamId: member.team.id, name, createdBy: member.userId };
		const made = await insertTemplate(trx, entry);
		if (!made) throw new Refused('The team has a template of this name already.', 'name');
		await record(trx, member, 'template.kept', subject(made.id), { name, sheet: number });
		return made.id;
	});
}

/** Puts the layout of a sheet in place of what a template says. Sheets set by it stay as they are. */
export async function replaceTemplate(
	shop: Reading,
	member: Member,
	number: number,
	{ id, revision, ...shared }: Shared & { id: string; revision: number },
): Promise<void> {
	requireAccess(member, 'layout.edit');
	const content = await contentOf(shop.db, member, number, shared);
	await shop.db.transaction().execute(async (trx) => {
		const { name } = await held(trx, member, id, revision);
		await updateTemplate(trx, id, content);
		await record(trx, member, 'template.replaced', subject(id), { name, sheet: number });
	});
}

export async function renameTemplate(
	shop: Reading,
	member: Member,
	{ id, revision, name }: { id: string; revision: number; name: string },
): Promise<void> {
	requireAccess(member, 'layout.edit');
	await shop.db.transaction().execute(async (trx) => {
		const { name: before } = await held(trx, member, id, revision);
		if (before === name) return;
		await holdTemplateNames(trx, member.team.id);
		const taken = await templateNamed(trx, member.team.id, name);
		if (taken && taken.id !== id)
			throw new Refused('The team has a template of this name already.', 'name');
		await updateTemplate(trx, id, { name });
		await record(trx, member, 'template.renamed', subject(id), { name, before });
	});
}

/** Sheets that were set by it stay as they are. */
export async function removeTemplate(shop: Reading, member: Member, id: string): Promise<void> {
	requireAccess(member, 'layout.edit');
	await shop.db.transaction().execute(async (trx) => {
		const { name } = await held(trx, member, id, null);
		await deleteTemplate(trx, id);
		await record(trx, member, 'template.deleted', subject(id), { name });
	});
}

/** Sets a sheet by a template, on top of the revision that was looked at. */
export async function applyTemplate(
	shop: Workshop,
	member: Member,
	number: number,
	{ id, revision }: { id: string; revision: number },
): Promise<SaveResult> {
	requireAccess(member, 'layout.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const template = await findTemplate(shop.db, member.team.id, id);
	if (!template) throw new NotFound('template');
	const current = documentOf(await draftOf(shop.db, sheet.id, sheet.revision));
	const document = setByTemplate<Draft>(current, template);
	const result = await saveDraft(shop, member, number, { revision, document });
	if (result.status === 'saved' && result.saved.revision !== revision) {
		const detail = { name: template.name, sheet: number };
		await record(shop.db, member, 'template.applied', subject(id), detail);
	}
	return result;
}

const subject = (id: string) => ({ kind: 'template', id });

/** The template, held; told where it was changed since it was looked at. */
async function held(trx: Db, member: Member, id: string, revision: number | null) {
	const row = await holdTemplate(trx, member.team.id, id);
	if (!row) throw new NotFound('template');
	if (revision !== null && row.revision !== revision)
		throw new Conflict(
			'stale',
			'Somebody else changed this template meanwhile. Load the page again to see it; nothing was overwritten.',
		);
	return row;
}

async function contentOf(
	db: Db,
	member: Member,
	number: number,
	shared: Shared,
): Promise<TemplateContent> {
	const sheet = await sheetOf(db, member, number);
	const { layout, palette } = documentOf(await draftOf(db, sheet.id, sheet.revision));
	return {
		fields: templateOf(layout),
		ratio: shared.ratio ? layout.frame.ratio : null,
		palette: shared.palette ? palette : null,
	};
}
