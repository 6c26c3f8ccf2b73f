import { requireAccess, type Member } from '../access/member.ts';
import type { IntakeStatus } from '../../schemas/desk.ts';
import { uploadFields } from '../../schemas/upload.ts';
import { receiveForm, type ReceivedForm } from '../files/multipart.ts';
import { sampleForm } from '../files/sample.ts';
import type { IntakeState } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { lockDigest } from '../repositories/files.repository.ts';
import {
	countOpenIntakes,
	findIntake,
	insertIntake,
	moveIntake,
	recentIntakes,
	type IntakeRow,
} from '../repositories/intakes.repository.ts';
import { record } from './activity.service.ts';
import { Conflict, NotFound, Unfit } from './outcomes.ts';
import { personName } from './people.ts';
import { dropUnused } from './stored-files.ts';

/** Uploads of one team that may wait or be read at once. */
const mostOpen = 20;

/** The largest file that is taken in, in bytes: MERESTONE_MAX_UPLOAD, 1 GB unless set. */
export const maxUpload = (): number => Number(process.env.MERESTONE_MAX_UPLOAD ?? 1_000_000_000);

/**
 * Takes in a form with a file of boundaries and has it read by a job. The file is on the disk and the job
 * is asked for when this answers with the number under which to follow it.
 */
export async function beginIntake(
	shop: Workshop,
	member: Member,
	request: Request,
): Promise<{ id: string }> {
	return takeIn(shop, member, () => receiveForm(request, shop.files, maxUpload()));
}

/** Takes in the sample republic the way an uploaded file is; `folder` is where its file lies. */
export async function beginSampleIntake(
	shop: Workshop,
	member: Member,
	folder?: string,
): Promise<{ id: string }> {
	return takeIn(shop, member, async () => {
		const form = await sampleForm(shop.files, folder);
		if (!form) throw new Unfit('sample-missing', sampleMissing);
		return form;
	});
}

const sampleMissing =
	'The sample file is missing from this installation: sample-data/tavaroe.geojson. Upload a file of your own, or tell whoever runs the server.';

async function takeIn(
	shop: Workshop,
	member: Member,
	receive: () => Promise<ReceivedForm>,
): Promise<{ id: string }> {
	requireAccess(member, 'boundaries.upload');
	if ((await countOpenIntakes(shop.db, member.team.id)) >= mostOpen) {
		throw new Conflict('too-many-open', `${mostOpen} uploads wait or are being read already`);
	}
	const form = await receive();
	try {
		return { id: await enter(shop, member, form) };
	} finally {
		await form.file.discard();
	}
}

async function enter(shop: Workshop, member: Member, form: ReceivedForm): Promise<string> {
	const fields = uploadFields.safeParse(form.fields);
	if (!fields.success) throw unfitFields(fields.error.issues);
	if (form.file.bytes === 0) throw new Unfit('empty-file', 'the file is empty');
	const { sheetName, ...options } = fields.data;
	const { digest, bytes } = form.file;
	return shop.db.transaction().execute(async (trx) => {
		await lockDigest(trx, digest);
		const id = await insertIntake(trx, {
			team_id: member.team.id,
			created_by: member.userId,
			file_name: form.fileName,
			file_bytes: bytes,
			file_digest: digest,
			sheet_name: sheetName ?? nameOfFile(form.fileName),
			options: JSON.stringify(options),
			state: 'waiting',
		});
		await shop.queue.send(trx, 'intake', { intakeId: id });
		await record(trx, member, 'boundaries.uploaded', { kind: 'intake', id }, { bytes });
		await form.file.keep();
		return id;
	});
}

const nameOfFile = (fileName: string) =>
	fileName.replace(/(\.(geo|topo)?json|\.zip|\.shp)+$/i, '').replace(/[_]+/g, ' ') || fileName;

export const unfitFields = (issues: readonly { path: PropertyKey[]; message: string }[]) =>
	new Unfit('malformed', 'some fields of the form were not understood', {
		issues: issues.map(({ path, message }) => ({ field: path.join('.'), message })),
	});

export async function intakeStatus(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	id: string,
): Promise<IntakeStatus> {
	requireAccess(member, 'sheet.read');
	return statusOf(await intakeOf(shop, member, id));
}

/** The latest uploads; what they ask is told by themselves, since it may be long. */
export async function listIntakes(
	shop: Pick<Workshop, 'db'>,
	member: Member,
): Promise<IntakeStatus[]> {
	requireAccess(member, 'sheet.read');
	const rows = await recentIntakes(shop.db, member.team.id, 50);
	return rows.map((row) => ({ ...statusOf(row), question: null }));
}

/** Stops an intake that waits, is being read, asks or has failed, and forgets its file. */
export async function cancelIntake(shop: Workshop, member: Member, id: string): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	const intake = await intakeOf(shop, member, id);
	await shop.db.transaction().execute(async (trx) => {
		const end = { state: 'cancelled', step: '', share: 0, file_digest: null } as const;
		const open: IntakeState[] = ['waiting', 'reading', 'asking', 'failed'];
		const moved = await moveIntake(trx, intake.id, open, { ...end, question: null });
		if (!moved) throw new Conflict('not-open', 'it is not being read any more');
		await record(trx, member, 'boundaries.cancelled', { kind: 'intake', id: intake.id });
		if (intake.file_digest) await dropUnused(trx, shop.files, intake.file_digest);
	});
}

/** Has a failed intake read once more, from the file that was kept. */
export async function retryIntake(shop: Workshop, member: Member, id: string): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	const intake = await intakeOf(shop, member, id);
	await shop.db.transaction().execute(async (trx) => {
		const again = { state: 'waiting', step: '', share: 0, refusal: null, attempts: 0 } as const;
		if (!(await moveIntake(trx, intake.id, ['failed'], again))) {
			throw new Conflict('not-failed', 'only an upload that failed can be read again');
		}
		await shop.queue.send(trx, 'intake', { intakeId: intake.id });
		await record(trx, member, 'boundaries.retried', { kind: 'intake', id: intake.id });
	});
}

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

/** An upload of this team, or `NotFound`. */
export async function intakeOf(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	id: string,
): Promise<IntakeRow> {
	const row = uuid.test(id) ? await findIntake(shop.db, member.team.id, id) : undefined;
	if (!row) throw new NotFound('upload');
	return row;
}

const statusOf = (row: IntakeRow): IntakeStatus => ({
	id: row.id,
	fileName: row.file_name,
	fileBytes: row.file_bytes,
	sheetName: row.sheet_name,
	state: row.state,
	step: row.step,
	share: row.share,
	attempts: row.attempts,
	createdAt: row.created_at.toISOString(),
	createdBy: personName(row),
	refusal: row.refusal as IntakeStatus['refusal'],
	sheet: row.sheet_number,
	question: row.question as unknown as IntakeStatus['question'],
	remembered: (row.remembered ?? []) as unknown as IntakeStatus['remembered'],
});
