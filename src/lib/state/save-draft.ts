import type { Draft } from '$lib/engines/editions/draft';
import type { DraftSaved } from '$lib/schemas/desk';

/** What a save that was taken answers at least; `document` where the server changed what was sent. */
export interface Saved<Doc> {
	revision: number;
	/** ISO 8601 */
	savedAt: string;
	document?: Doc;
}

/** Somebody else saved first; nothing was overwritten. */
export interface Stale<Doc> {
	revision: number;
	savedBy: string | null;
	savedAt: string | null;
	/** what they saved */
	document: Doc;
}

/** How the server answered a save, or that it could not be reached. */
export type SaveAnswer<Doc, Answer extends Saved<Doc>> =
	| { kind: 'saved'; saved: Answer }
	| { kind: 'stale'; stale: Stale<Doc> }
	| { kind: 'signed-out' }
	| { kind: 'refused'; message: string }
	| { kind: 'unreachable' };

export type SaveDraft<Doc, Answer extends Saved<Doc>> = (
	revision: number,
	document: Doc,
) => Promise<SaveAnswer<Doc, Answer>>;

/** Saves a sheet's draft, with the colouring shown where the server would find another by itself. */
export type SaveWithInks = (
	revision: number,
	document: Draft,
	inks?: readonly number[],
) => Promise<SaveAnswer<Draft, DraftSaved>>;

/** How a body that was sent was answered; every way it can end is an answer. */
export type PostAnswer<Taken, Theirs> =
	| { kind: 'saved'; saved: Taken }
	| { kind: 'stale'; stale: Theirs }
	| Exclude<SaveAnswer<never, Saved<never>>, { kind: 'saved' } | { kind: 'stale' }>;

/** Saves by `POST {address}`; never throws. */
export const saveTo =
	<Doc, Answer extends Saved<Doc>>(
		address: string,
		fetcher: typeof fetch = fetch,
	): SaveDraft<Doc, Answer> =>
	(revision, document) =>
		postJson<Answer, Stale<Doc>>(address, { revision, document }, fetcher);

/** The same for a sheet's draft; never throws. */
export const saveSheetTo =
	(address: string, fetcher: typeof fetch = fetch): SaveWithInks =>
	(revision, document, inks) =>
		postJson<DraftSaved, Stale<Draft>>(address, { revision, document, inks }, fetcher);

export async function postJson<Taken, Theirs>(
	address: string,
	body: unknown,
	fetcher: typeof fetch = fetch,
): Promise<PostAnswer<Taken, Theirs>> {
	let response: Response;
	try {
		response = await fetcher(address, {
			method: 'POST',
			headers: { 'content-type': 'application/json', accept: 'application/json' },
			body: JSON.stringify(body),
			redirect: 'manual',
		});
	} catch {
		return { kind: 'unreachable' };
	}
	// a guard that leads to the sign-in page means the same as 401
	if (response.status === 401 || response.type === 'opaqueredirect') return { kind: 'signed-out' };
	if (response.status >= 500 || response.status === 429) return { kind: 'unreachable' };
	return readAnswer(response);
}

async function readAnswer<Taken, Theirs>(response: Response): Promise<PostAnswer<Taken, Theirs>> {
	const body: unknown = await response.json().catch(() => null);
	if (response.ok) return { kind: 'saved', saved: body as Taken };
	if (response.status === 409 && !(body && typeof body === 'object' && 'message' in body))
		return { kind: 'stale', stale: body as Theirs };
	return { kind: 'refused', message: sentenceIn(body) };
}

function sentenceIn(body: unknown): string {
	const { message, error } = (body ?? {}) as { message?: string; error?: { message?: string } };
	return message ?? error?.message ?? 'The server refused this change.';
}
