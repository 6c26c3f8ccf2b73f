import { resolve } from 'node:path';
import { folderStore } from './folder.ts';
import type { FileStore } from './store.ts';

export { folderStore } from './folder.ts';
export { FileMissing, type FileStore, type Received } from './store.ts';

let store: FileStore | undefined;

/** This process's store of uploaded and exported bytes; a folder below MERESTONE_DATA. */
export function fileStore(): FileStore {
	store ??= folderStore(resolve(process.env.MERESTONE_DATA ?? '.data', 'files'));
	return store;
}
