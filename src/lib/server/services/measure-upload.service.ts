import { tableFields } from '../../schemas/measure-forms.ts';
import { requireAccess, type Member } from '../access/member.ts';
import { receiveForm, type ReceivedForm } from '../files/multipart.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { sheetOf } from './draft.service.ts';
import { enterTable, readBytes } from './measure-entry.ts';
import { Unfit } from './outcomes.ts';

/** The largest table that is taken in, in bytes. */
export const mostTableBytes = 200_000_000;

/** Takes in a form with a table, reads it in a thread and keeps both the file and what was read. */
export async function uploadTable(
	shop: Workshop,
	member: Member,
	number: number,
	request: Request,
): Promise<{ number: number }> {
	requireAccess(member, 'measures.edit');
	const sheet = await sheetOf(shop.db, member, number);
	const form = await receiveForm(request, shop.files, mostTableBytes);
	try {
		const { name, ...reading } = fieldsOf(form);
		if (form.file.bytes === 0) throw new Unfit('empty-file', 'The file is empty.');
		const { fileName, file } = form;
		const read = await readBytes(shop, file.path, fileName, reading);
		const table = { fileName, file, reading, read, name: name ?? nameOfFile(fileName) };
		return await enterTable(shop, member, sheet.number, table);
	} finally {
		await form.file.discard();
	}
}

function fieldsOf(form: ReceivedForm) {
	const fields = tableFields.safeParse(form.fields);
	if (fields.success) return fields.data;
	const issues = fields.error.issues.map(({ path, message }) => ({
		field: path.join('.'),
		message,
	}));
	const sentence = issues.map(({ field, message }) => `${field}: ${message}`).join(' ');
	throw new Unfit('malformed', `The form was not understood. ${sentence}`, { issues });
}

const nameOfFile = (fileName: string) =>
	fileName.replace(/\.(csv|tsv|txt|xlsx|xlsm)$/i, '').replace(/_+/g, ' ') || fileName;
