import { counted } from '../../format';
import type { Proposal, ProposalAnswer, ProposalKind } from '$lib/engines/palettes';

/** What each proposal puts first. */
export const kindWords: Record<ProposalKind, string> = {
	fewest: 'Fewest inks moved',
	least: 'Least movement in all',
	grey: 'Widest apart in grey print',
	known: 'From a well-known set',
};

/** Proposals that come to the same inks are one, with all that it is best for. */
export function together(
	proposals: readonly Proposal[],
): { proposal: Proposal; kinds: ProposalKind[] }[] {
	const blocks: { proposal: Proposal; kinds: ProposalKind[] }[] = [];
	for (const proposal of proposals) {
		const same = blocks.find((one) => one.proposal.inks.join() === proposal.inks.join());
		if (same) same.kinds.push(proposal.kind);
		else blocks.push({ proposal, kinds: [proposal.kind] });
	}
	return blocks;
}

const unfound: Record<ProposalKind, string> = {
	fewest: 'one that moves few inks',
	least: 'one that moves all of them a little',
	grey: 'one with gaps of 8 in L* and more for grey print',
	known: 'one from a well-known set',
};

/**
 * Why there is no mend, or which of the ways to mend found none beside those that did: what is asked is
 * reached then, only not in that way.
 */
export function unmendedWords(answers: readonly ProposalAnswer[]): string[] {
	const reasons = answers.flatMap((answer) => ('reason' in answer ? [answer.reason] : []));
	if (!answers.some((answer) => 'proposal' in answer))
		return [...new Set(reasons)].map((reason) => `${reason}.`);
	const missing = answers.flatMap((answer) =>
		'kind' in answer && answer.status === 'not-found' ? [unfound[answer.kind]] : [],
	);
	return missing.length ? [`Not found within the effort: ${missing.join('; ')}.`] : [];
}

/** How far the search for mends is, in a sentence that is read out; '' before it began. */
export function searchWords(search: {
	working: boolean;
	failure: string;
	found: number;
	/** whether anything was answered */
	ended: boolean;
}): string {
	const { working, failure, found, ended } = search;
	if (working) {
		const soFar = found ? `; ${found} found so far` : '';
		return `Looking for inks that every reader can tell apart${soFar}.`;
	}
	if (failure) return `The search ended without an answer (${failure}).`;
	if (!ended) return '';
	return found ? `${counted(found, 'mend')} found.` : 'No mend was found.';
}
