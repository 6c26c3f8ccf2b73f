import { open, type FileHandle } from 'node:fs/promises';
import path from 'node:path';
import type { ReceivedForm } from './multipart.ts';
import type { FileStore } from './store.ts';

const fileName = 'tavaroe.geojson';
const fields = { sheetName: 'Districts of Tavaröe', keyField: 'code', nameField: 'name' };

/**
 * The sample republic as if its file had just been uploaded with the form filled in, or null where this
 * installation comes without it. Whoever gets it must keep or discard the file.
 * @param folder found from the directory the process runs in, as migrations are
 */
export async function sampleForm(
	store: FileStore,
	folder = path.resolve('sample-data'),
): Promise<ReceivedForm | null> {
	const source = await opened(path.join(folder, fileName));
	if (!source) return null;
	try {
		return { fields, file: await store.receive(source.createReadStream()), fileName };
	} finally {
		await source.close();
	}
}

/** Opened before anything reads from it, so that a missing file is known in time. */
const opened = (file: string): Promise<FileHandle | null> =>
	open(file).catch((error: NodeJS.ErrnoException) => {
		if (error.code === 'ENOENT') return null;
		throw error;
	});
