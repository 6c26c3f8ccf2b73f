import { Readable } from 'node:stream';
import type { Row } from '../database/schema.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import { findTeamById } from '../repositories/teams.repository.ts';
import { paintInput } from '../services/drawing.service.ts';
import { failExport, keepExport, type MadeFile } from '../services/export-end.service.ts';
import {
	exportGround,
	requireSameBoundaries,
	type ExportGround,
} from '../services/export-ground.ts';
import { aboutExport, requestDigest } from '../services/export-request.ts';
import { Conflict, NotFound } from '../services/outcomes.ts';
import { runClaimed, wakeSilent, type ClaimedJob } from './claimed-job.ts';
import type { ExportInput } from './export.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** Makes one file of an edition or a draft, in a thread, and keeps it. */
export const runExport = (shop: Workshop, exportId: string, shutdown: AbortSignal) =>
	runClaimed(shop, exportJob(shop), exportId, shutdown);

/** Takes up again every file that was left lying. */
export const wakeSilentExports = (shop: Workshop) =>
	wakeSilent(shop, 'exports', (exportId) => shop.queue.send(shop.db, 'export', { exportId }));

type Worked = MadeFile | { refused: string };

const exportJob = (shop: Workshop): ClaimedJob<'exports', Worked> => ({
	table: 'exports',
	work: (row, signal, progress) => work(shop, row, signal, progress),
	settle: (claim, worked) =>
		'refused' in worked ? failExport(shop, claim, worked.refused) : keepExport(shop, claim, worked),
	fail: (claim, message) => failExport(shop, claim, message),
	words: {
		firstStep: 'Reading the sheet',
		stopped: (times) => `It was tried ${times} times and the worker stopped each time.`,
		outOfMemory: 'The file takes more memory than one worker may use. Ask for fewer dots an inch.',
		fault: 'The file could not be made because of a fault here. Nothing was changed.',
	},
});

async function work(
	shop: Workshop,
	row: Row<'exports'>,
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<Worked> {
	const input = await inputFor(shop, row);
	if ('refused' in input) return input;
	const outcome = await shop.pool.run('makeExport', input, { signal, progress });
	if (outcome.status === 'refused') return { refused: outcome.message };
	const { bytes, mediaType, notes } = outcome.file;
	progress({ step: 'Keeping the file', share: 0.98 });
	return { received: await shop.files.receive(chunks(bytes)), mediaType, notes };
}

/** In pieces, so that a store far away is not handed everything at once. */
function chunks(bytes: Uint8Array): Readable {
	const size = 1 << 20;
	const count = Math.ceil(bytes.byteLength / size);
	return Readable.from(
		Array.from({ length: count }, (_, i) => Buffer.from(bytes.subarray(i * size, (i + 1) * size))),
	);
}

async function inputFor(
	shop: Workshop,
	row: Row<'exports'>,
): Promise<ExportInput | { refused: string }> {
	try {
		const sheet = await findSheetById(shop.db, row.sheet_id);
		const team = await findTeamById(shop.db, row.team_id);
		if (!sheet || !team) return { refused: 'The sheet is not there any more.' };
		const ground = await exportGround(shop.db, sheet, row);
		const about = aboutExport(team, sheet, ground, row);
		if (requestDigest(row, about, ground) !== row.request_digest) {
			return { refused: 'The sheet has changed since the file was asked for. Ask for it again.' };
		}
		await requireSameBoundaries(shop.db, ground);
		return { ...(await drawn(shop, row, ground)), about };
	} catch (problem) {
		if (problem instanceof NotFound || problem instanceof Conflict) {
			return { refused: problem.message };
		}
		throw problem;
	}
}

async function drawn(
	shop: Workshop,
	{ kind, options, reader, issue }: Row<'exports'>,
	{ view, draft, inks, theme, further }: ExportGround,
): Promise<Omit<ExportInput, 'about'>> {
	const input = await paintInput(shop.db, view, draft, inks, reader, issue, theme);
	return { ...input, further, kind, options, names: view.names };
}
