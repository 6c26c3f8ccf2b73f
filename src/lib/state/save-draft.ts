import type { Draft } from '$lib/engines/editions/draft';
import type { DraftSaved, DraftStale } from '$lib/schemas/desk';

/** How the server answered a save, or that it could not be reached. */
export type SaveAnswer =
	| { kind: 'saved'; saved: DraftSaved }
	| { kind: 'stale'; stale: DraftStale }
	| { kind: 'signed-out' }
	| { kind: 'refused'; message: string }
	| { kind: 'unreachable' };

export type SaveDraft = (revision: number, document: Draft) => Promise<SaveAnswer>;

/** Saves by `POST {address}`; never throws: every way it can end is an answer. */
export const saveTo =
	(address: string, fetcher: typeof fetch = fetch): SaveDraft =>
	async (revision, document) => {
		let response: Response;
		try {
			response = await fetcher(address, {
				method: 'POST',
				headers: { 'content-type': 'application/json', accept: 'application/json' },
				body: JSON.stringify({ revision, document }),
				redirect: 'manual',
			});
		} catch {
			return { kind: 'unreachable' };
		}
		// a guard that leads to the sign-in page means the same as 401
		if (response.status === 401 || response.type === 'opaqueredirect')
			return { kind: 'signed-out' };
		if (response.status >= 500 || response.status === 429) return { kind: 'unreachable' };
		return readAnswer(response);
	};

async function readAnswer(response: Response): Promise<SaveAnswer> {
	const body: unknown = await response.json().catch(() => null);
	if (response.ok) return { kind: 'saved', saved: body as DraftSaved };
	if (response.status === 409) return { kind: 'stale', stale: body as DraftStale };
	return { kind: 'refused', message: sentenceIn(body) };
}

function sentenceIn(body: unknown): string {
	const { message, error } = (body ?? {}) as { message?: string; error?: { message?: string } };
	return message ?? error?.message ?? 'The server refused this change.';
}
