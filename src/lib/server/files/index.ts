import { resolve } from 'node:path';
import { folderStore } from './folder.ts';
import type { FileStore } from './store.ts';

export { folderStore } from './folder.ts';
export { FileMissing, type FileStore, type Received } from './store.ts';

let store: FileStore | undefined;

/** This process's store of uploaded and exported bytes; MERESTONE_FILES names its folder. */
export function fileStore(): FileStore {
	store ??= folderStore(resolve(process.env.MERESTONE_FILES ?? '.data/files'));
	return store;
}
