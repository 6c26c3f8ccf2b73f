import type { Proposal, ProposalKind } from '$lib/engines/palettes';

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
