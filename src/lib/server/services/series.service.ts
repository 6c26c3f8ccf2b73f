import type { AlikeResult } from '../../schemas/template.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findTemplate } from '../repositories/templates.repository.ts';
import { NotFound } from './outcomes.ts';
import { applyTemplate } from './templates.service.ts';

/**
 * Sets several sheets alike again by their template. Each is saved on top of the revision that was looked at;
 * one that somebody else saved meanwhile stays as they left it and is told.
 */
export async function setAlike(
	shop: Workshop,
	member: Member,
	{ id, sheets }: { id: string; sheets: { number: number; revision: number }[] },
): Promise<AlikeResult[]> {
	requireAccess(member, 'layout.edit');
	if (!(await findTemplate(shop.db, member.team.id, id))) throw new NotFound('template');
	const results: AlikeResult[] = [];
	for (const sheet of sheets) results.push(await setOne(shop, member, id, sheet));
	return results;
}

async function setOne(
	shop: Workshop,
	member: Member,
	id: string,
	{ number, revision }: { number: number; revision: number },
): Promise<AlikeResult> {
	try {
		const result = await applyTemplate(shop, member, number, { id, revision });
		if (result.status === 'stale') return { number, outcome: 'stale', by: result.stale.savedBy };
		const outcome = result.saved.revision === revision ? 'same' : 'set';
		return { number, outcome, by: null };
	} catch (problem) {
		// a sheet may be deleted while others are set
		if (problem instanceof NotFound) return { number, outcome: 'gone', by: null };
		throw problem;
	}
}
