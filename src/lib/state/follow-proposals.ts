import type { ProposalNote, ProposalProgress } from '$lib/schemas/desk-territories';

const every = 1_000;

type Followed = Pick<ProposalNote, 'number'> & { state: string };

/**
 * Asks again and again how far proposals or the like are, and tells once any is in another state than the
 * page knows.
 * No answer is no news: it asks again. A page that is still being loaded anew is not asked for twice.
 * @returns stops asking
 */
export function followProposals<Progress extends Followed = ProposalProgress>(
	address: string,
	known: readonly Pick<Progress, 'number' | 'state'>[],
	{
		told,
		ended,
		reached,
	}: {
		told: (now: Progress[]) => void;
		/** a promise, where there is one, is that of the page being loaded anew */
		ended: () => unknown;
		/** whether the last question was answered at all */
		reached?: (yes: boolean) => void;
	},
	fetcher: typeof fetch = fetch,
): () => void {
	let stopped = false;
	let timer: ReturnType<typeof setTimeout>;
	const look = async () => {
		const now = await answer<Progress>(fetcher, address);
		if (stopped) return;
		reached?.(now !== null);
		const states = new Map(known.map(({ number, state }) => [number, state]));
		told(now ?? []);
		if (now?.some(({ number, state }) => states.get(number) !== state)) await ended();
		if (!stopped) timer = setTimeout(() => void look(), every);
	};
	timer = setTimeout(() => void look(), every);
	return () => {
		stopped = true;
		clearTimeout(timer);
	};
}

/** Null where nothing came, or a page in place of the list, as after the session has run out. */
async function answer<Progress>(
	fetcher: typeof fetch,
	address: string,
): Promise<Progress[] | null> {
	try {
		const response = await fetcher(address);
		const body: unknown = response.ok ? await response.json() : null;
		return Array.isArray(body) ? body : null;
	} catch {
		return null;
	}
}
