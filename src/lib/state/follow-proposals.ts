import type { ProposalNote, ProposalProgress } from '$lib/schemas/desk-territories';

const every = 1_000;

type Followed = Pick<ProposalNote, 'number'> & { state: string };

/**
 * Asks again and again how far proposals or the like are, and tells once any is in another state than the
 * page knows.
 * A lost connection is no news: it asks again.
 * @returns stops asking
 */
export function followProposals<Progress extends Followed = ProposalProgress>(
	address: string,
	known: readonly Pick<Progress, 'number' | 'state'>[],
	{ told, ended }: { told: (now: Progress[]) => void; ended: () => void },
	fetcher: typeof fetch = fetch,
): () => void {
	let stopped = false;
	let timer: ReturnType<typeof setTimeout>;
	const look = async () => {
		const response = await fetcher(address).catch(() => null);
		const now: Progress[] = response?.ok ? await response.json() : [];
		if (stopped) return;
		const states = new Map(known.map(({ number, state }) => [number, state]));
		told(now);
		if (now.some(({ number, state }) => states.get(number) !== state)) ended();
		timer = setTimeout(() => void look(), every);
	};
	timer = setTimeout(() => void look(), every);
	return () => {
		stopped = true;
		clearTimeout(timer);
	};
}
