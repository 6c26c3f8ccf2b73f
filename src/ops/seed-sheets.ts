import path from 'node:path';
import type { Member } from '../lib/server/access/member.ts';
import { database } from '../lib/server/database/connection.ts';
import { fileStore } from '../lib/server/files/index.ts';
import { inlinePool } from '../lib/server/jobs/inline-pool.ts';
import { runIntake } from '../lib/server/jobs/intake.job.ts';
import type { Workshop } from '../lib/server/jobs/workshop.ts';
import { saveDraft } from '../lib/server/services/draft.service.ts';
import { issueEdition } from '../lib/server/services/edition.service.ts';
import { beginSampleIntake, intakeStatus } from '../lib/server/services/intake.service.ts';
import { deskSheet, sheetList } from '../lib/server/services/sheet.service.ts';
import { root } from './files.mjs';

/** Districts whose ink the invented office keeps from sheet to sheet: two coasts and the enclave city. */
const keptDistricts = ['0101', '0711', '1006'];

/**
 * Gives a team that has no sheet the sample republic: read, coloured, with a few locks, issued once. The
 * same services do it that answer people, so whatever holds for a sheet holds for this one.
 * @returns its number, null where the team had sheets
 */
export async function seedDemoSheet(shop: Workshop, member: Member): Promise<number | null> {
	if ((await sheetList(shop, member)).length > 0) return null;
	const number = await takeIn(shop, member);
	await arrange(shop, member, number);
	const { revision } = await deskSheet(shop, member, number);
	await issueEdition(shop, member, number, revision, 'First edition of the districts.');
	return number;
}

/** Jobs are done here and now, so nothing is asked of a worker, and nobody is held up. */
export function seedingWorkshop(): Workshop {
	const pool = inlinePool();
	const queue = { send: async () => undefined, stop: async () => undefined };
	return { db: database(), files: fileStore(), queue, pool, checks: pool };
}

async function takeIn(shop: Workshop, member: Member): Promise<number> {
	const { id } = await beginSampleIntake(shop, member, path.join(root, 'sample-data'));
	return readIn(shop, member, id);
}

/** Reads what was taken in, to its end. */
export async function readIn(shop: Workshop, member: Member, id: string): Promise<number> {
	await runIntake(shop, id, new AbortController().signal);
	const { sheet, state, refusal } = await intakeStatus(shop, member, id);
	if (sheet === null)
		throw new Error(`the sample data was not taken in: ${state} ${refusal?.message}`);
	return sheet;
}

async function arrange(shop: Workshop, member: Member, number: number): Promise<void> {
	const { draft, revision, regions, colouring } = await deskSheet(shop, member, number);
	if (colouring?.status !== 'coloured') throw new Error('the sample data was not coloured');
	const locks = keptDistricts.map((key) => [
		key,
		{ ink: colouring.inks[regions.key.indexOf(key)], cost: 1 },
	]);
	const layout = {
		...draft.layout,
		title: 'Republic of Tavaröe',
		subtitle: 'Districts and provinces',
		groupColumn: 'province',
		// districts too small for their names have a number, and a list beside them
		lettering: { ...draft.layout.lettering, numbers: true },
		credits: 'Tavaröe Survey Office. An invented country; free to use (CC0-1.0).',
	};
	const document = { ...draft, locks: Object.fromEntries(locks), layout };
	const { status } = await saveDraft(shop, member, number, { revision, document });
	if (status !== 'saved') throw new Error('the demo sheet was saved by somebody else');
}
