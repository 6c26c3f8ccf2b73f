import type { Draft } from '$lib/engines/editions/draft';
import type { DeskColouring } from '$lib/schemas/desk';

/**
 * Work that the server does not have yet, kept in this browser (IndexedDB) from the moment of the
 * change until the server has confirmed it: a lost connection, an ended sign-in, a closed page or a
 * crashed browser loses nothing.
 */
export interface KeptDraft<Doc> {
	/** the revision this work began from, and what stood in it */
	revision: number;
	base: Doc;
	document: Doc;
	/** the colouring shown with it, where the server would find another by itself */
	colouring?: DeskColouring;
	/** ISO 8601 */
	keptAt: string;
}

/** `place`: which draft it is; one sheet may have several. */
export interface Keeper<Doc> {
	keep(place: string, draft: Omit<KeptDraft<Doc>, 'keptAt'>): Promise<void>;
	read(place: string): Promise<KeptDraft<Doc> | null>;
	forget(place: string): Promise<void>;
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

export const browserKeeper = <Doc>(): Keeper<Doc> => ({
	keep: (place, draft) => {
		const kept: KeptDraft<Doc> = { ...draft, keptAt: new Date().toISOString() };
		return use('readwrite', (store) => store.put(kept, place)).then(() => {});
	},
	read: (place) =>
		use<KeptDraft<Doc> | undefined>('readonly', (store) => store.get(place)).then(
			(kept) => kept ?? null,
		),
	forget: (place) => use('readwrite', (store) => store.delete(place)),
});

/** Whoever knows which colouring is shown with a document. */
interface Colourings {
	toKeep(document: Draft): DeskColouring | undefined;
	know(document: Draft, answer: DeskColouring, inks: Int32Array): void;
}

/** Keeps the colouring with a sheet's draft, and shows it again when the draft is read. */
export const keeperWithInks = (keeper: Keeper<Draft>, colourings: Colourings): Keeper<Draft> => ({
	...keeper,
	keep: (place, draft) =>
		keeper.keep(place, { ...draft, colouring: colourings.toKeep(draft.document) }),
	async read(place) {
		const kept = await keeper.read(place);
		const { document, colouring } = kept ?? {};
		if (document && colouring?.status === 'coloured')
			colourings.know(document, colouring, Int32Array.from(colouring.inks));
		return kept;
	},
});
