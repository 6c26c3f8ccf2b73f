import type { MarkKind } from '$lib/components/Mark.svelte';
import type { ProposalNote } from '$lib/schemas/desk-territories';

const states: Record<ProposalNote['state'], string> = {
	waiting: 'waiting',
	running: 'being worked out',
	kept: 'open',
	impossible: 'no plan',
	undecided: 'not within tolerance',
	failed: 'failed',
	cancelled: 'stopped',
	adopted: 'adopted',
	dropped: 'dropped',
};

/** What a proposal's state is called, and its mark: square where it cannot be adopted as it is. */
export function stateWords({ state, outcome }: Pick<ProposalNote, 'state' | 'outcome'>): {
	state: string;
	mark: MarkKind | null;
} {
	const broken = (outcome?.faults.length ?? 0) > 0;
	const missed = (outcome?.misses.length ?? 0) > 0;
	if (state === 'impossible' || state === 'failed' || broken)
		return { state: broken ? 'breaks a rule' : states[state], mark: 'error' };
	if (state === 'undecided' || missed) return { state: states.undecided, mark: 'warning' };
	if (state === 'kept' || state === 'adopted') return { state: states[state], mark: 'clear' };
	return { state: states[state], mark: null };
}
