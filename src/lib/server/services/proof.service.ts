import type { ColouringResult, Proof } from '../../engines/colouring/index.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { ProofFormat } from '../jobs/proof.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { listEditions } from '../repositories/editions.repository.ts';
import type { DraftRow, SheetRecord } from '../repositories/sheets.repository.ts';
import { boundaryView } from './boundary-view.ts';
import { documentOf, draftOf, sheetOf } from './draft.service.ts';
import { fileStem } from './drawing.service.ts';
import { Conflict, NotFound } from './outcomes.ts';

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

/** Of which state of a sheet, and in which form; without `revision` and `edition` the draft as it is now. */
export interface ProofAsked {
	revision?: number;
	edition?: number;
	format: ProofFormat;
}

/**
 * The proof of a draft's colouring, or of the collision where it has none: as a proof file, or in the
 * open forms as a zip. An edition's is that of the draft it was issued from.
 */
export async function sheetProof(
	shop: Pick<Workshop, 'db' | 'pool'>,
	member: Member,
	number: number,
	asked: ProofAsked,
	asker: AbortSignal,
): Promise<ProofBytes> {
	requireAccess(member, 'sheet.read');
	const sheet = await sheetOf(shop.db, member, number);
	const row = await draftOf(shop.db, sheet.id, await revisionOf(shop.db, sheet, asked));
	const result = storedResult(row);
	if (!result) throw new Conflict('nothing-shown', whyMissing['nothing-shown']);
	const { keys, names, borders } = await boundaryView(shop.db, row.boundary_set_id);
	const { format } = asked;
	const draft = documentOf(row);
	const input = { title: sheet.name, keys, names, borders, draft, result, format };
	const written = await shop.pool.run('writeProof', input, { signal: asker });
	if ('missing' in written) throw new Conflict(written.missing, whyMissing[written.missing]);
	const name = `${fileStem(sheet.name)}-revision-${row.revision}-proof.${format}`;
	return { name, mediaType: mediaTypes[format], bytes: written.bytes };
}

async function revisionOf(db: Db, sheet: SheetRecord, { revision, edition }: ProofAsked) {
	if (edition === undefined) return revision ?? sheet.revision;
	const issued = (await listEditions(db, sheet.id)).find(({ number }) => number === edition);
	if (!issued) throw new NotFound('edition');
	return issued.revision;
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

/** What an address asks for by `?revision=` or `?edition=`; a number that is none stays NaN and is not found. */
export function proofAsked({ searchParams }: URL, format: ProofFormat): ProofAsked {
	const number = (name: string) => {
		const asked = searchParams.get(name);
		if (asked === null) return {};
		return { [name]: /^\d{1,10}$/.test(asked) ? Number(asked) : NaN };
	};
	return { ...number('revision'), ...number('edition'), format };
}
