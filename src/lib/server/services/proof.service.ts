import type { ColouringResult, Proof } from '../../engines/colouring/index.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { ProofFormat } from '../jobs/proof.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import type { DraftRow } from '../repositories/sheets.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { fileStem } from './drawing.service.ts';
import { Conflict } from './outcomes.ts';

const mediaTypes: Record<ProofFormat, string> = {
	json: 'application/json; charset=utf-8',
	zip: 'application/zip',
};

const whyMissing = {
	'nothing-shown': 'There is no proof to hand out: nothing was settled about this colouring.',
	'nothing-refuted':
		'There is no proof that fewer inks would not do, so there is nothing for other tools to check.',
};

export interface ProofBytes {
	name: string;
	mediaType: string;
	bytes: Uint8Array;
}

/**
 * The proof of a draft's colouring, or of the collision where it has none: as a proof file, or in the
 * open forms as a zip. `revision` null is the draft as it is now; an edition's is that of its draft.
 */
export async function sheetProof(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	{ revision, format }: { revision: number | null; format: ProofFormat },
	asker: AbortSignal,
): Promise<ProofBytes> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await draftOf(shop.db, sheet.id, revision ?? sheet.revision);
	const result = storedResult(row);
	if (!result) throw new Conflict('nothing-shown', whyMissing['nothing-shown']);
	const { keys, names, borders } = await boundaryView(shop.db, row.boundary_set_id);
	const draft = documentOf(row);
	const input = { title: sheet.name, keys, names, borders, draft, result, format };
	const written = await shop.pool.run('writeProof', input, { signal: asker });
	if ('missing' in written) throw new Conflict(written.missing, whyMissing[written.missing]);
	const name = `${fileStem(sheet.name)}-revision-${row.revision}-proof.${format}`;
	return { name, mediaType: mediaTypes[format], bytes: written.bytes };
}

function storedResult(row: DraftRow): ColouringResult | null {
	const { inks, inks_used: inksUsed, lower_bound: lowerBound, explanation } = row;
	if (inks && inksUsed !== null && lowerBound !== null) {
		const proof = row.proof as unknown as Proof;
		const colouring = Int32Array.from(inks);
		return { status: 'coloured', colouring, inksUsed, lowerBound, proof };
	}
	return explanation as unknown as ColouringResult | null;
}

/** The revision an address asks for; null for the draft as it is now, NaN for what is none. */
export const revisionAsked = (url: URL): number | null => {
	const asked = url.searchParams.get('revision');
	return asked === null ? null : /^\d{1,10}$/.test(asked) ? Number(asked) : NaN;
};
