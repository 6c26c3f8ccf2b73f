import type { Draft } from '$lib/engines/editions/draft';

/**
 * Work that the server does not have yet, kept in this browser (IndexedDB) from the moment of the
 * change until the server has confirmed it: a lost connection, an ended sign-in, a closed page or a
 * crashed browser loses nothing.
 */
export interface KeptDraft {
	/** the revision this work began from, and what stood in it */
	revision: number;
	base: Draft;
	document: Draft;
	/** ISO 8601 */
	keptAt: string;
}

export interface Keeper {
	keep(sheetId: string, draft: Omit<KeptDraft, 'keptAt'>): Promise<void>;
	read(sheetId: string): Promise<KeptDraft | null>;
	forget(sheetId: string): Promise<void>;
}

const shelf = 'drafts';

const answer = <T>(request: IDBRequest<T>): Promise<T> =>
	new Promise((resolve, reject) => {
		request.onsuccess = () => resolve(request.result);
		request.onerror = () => reject(request.error);
	});

function open(): Promise<IDBDatabase> {
	const request = indexedDB.open('merestone', 1);
	request.onupgradeneeded = () => request.result.createObjectStore(shelf);
	return answer(request);
}

async function use<T>(
	mode: IDBTransactionMode,
	act: (store: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
	const database = await open();
	try {
		return await answer(act(database.transaction(shelf, mode).objectStore(shelf)));
	} finally {
		database.close();
	}
}

export const browserKeeper: Keeper = {
	keep: (sheetId, draft) => {
		const kept: KeptDraft = { ...draft, keptAt: new Date().toISOString() };
		return use('readwrite', (store) => store.put(kept, sheetId)).then(() => {});
	},
	read: (sheetId) =>
		use<KeptDraft | undefined>('readonly', (store) => store.get(sheetId)).then(
			(kept) => kept ?? null,
		),
	forget: (sheetId) => use('readwrite', (store) => store.delete(sheetId)),
};
