import { error } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { attachment } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { readHandover } from '$lib/server/services/handover.service';
import { handoverBytes, handoverFormats } from '$lib/server/services/handover-table';
import type { RequestHandler } from './$types';

/** A handover list as CSV or as a workbook: as it stands now, or as it was approved. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'measures.read');
	const { sheet, number, file } = params;
	const format = handoverFormats.find((one) => file === `handover-${number}.${one}`);
	if (!format) error(404, 'There is no such file here.');
	const list = await forPage(() => readHandover(workshop(), member, Number(sheet), Number(number)));
	const { name, mediaType, bytes } = await handoverBytes(list, format);
	return new Response(bytes as Uint8Array<ArrayBuffer>, {
		headers: {
			'content-type': mediaType,
			'content-length': String(bytes.byteLength),
			'content-disposition': attachment(name),
			'cache-control': 'private, no-store',
		},
	});
}) satisfies RequestHandler;
