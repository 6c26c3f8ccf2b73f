import { join } from 'node:path';
import { readFilesConfig, type FilesConfig } from '../config.ts';
import { folderStore } from './folder.ts';
import type { FileStore } from './store.ts';

export { folderStore } from './folder.ts';
export { FileMissing, FilesAway, type FileStore, type Received } from './store.ts';

let store: FileStore | undefined;

/** This process's store of uploaded and exported bytes, as the environment says. */
export const fileStore = (): FileStore => (store ??= storeFor(readFilesConfig(process.env)));

export const storeFor = ({ dataDirectory, s3 }: FilesConfig): FileStore => {
	const folder = join(dataDirectory, 'files');
	if (!s3) return folderStore(folder);
	return laterStore(() =>
		import('./s3.ts').then(({ s3Store }) => s3Store(s3, join(folder, 'spool'))),
	);
};

/** A store that is loaded when it is first used: the client of the service is large. */
function laterStore(load: () => Promise<FileStore>): FileStore {
	let loading: Promise<FileStore> | undefined;
	const loaded = () => (loading ??= load());
	return {
		receive: async (source) => (await loaded()).receive(source),
		open: async (digest) => (await loaded()).open(digest),
		local: async (digest) => (await loaded()).local(digest),
		has: async (digest) => (await loaded()).has(digest),
		delete: async (digest) => (await loaded()).delete(digest),
		tidy: async () => (await loaded()).tidy(),
	};
}
