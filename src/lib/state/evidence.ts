import type { Explanation, Proof } from '$lib/engines/colouring/problem';

/**
 * What is pointed out on the sheet beside the selection: the regions of a proof, locks that collide,
 * borders that a reader could miss, a place.
 */
export interface Evidence {
	/** what is shown, for the line under the sheet and for screen readers */
	words: string;
	/** regions drawn with a strong outline, in the order given; `ring` joins their anchors to a ring */
	strong: readonly number[];
	/** regions drawn with a light outline */
	light: readonly number[];
	/** the middle that every region of the ring touches */
	hub: number | null;
	ring: boolean;
	/** numbers into the sheet's border list */
	borders: readonly number[];
	/** number of the finding whose place is marked */
	finding: number | null;
}

const nothing: Evidence = {
	words: '',
	strong: [],
	light: [],
	hub: null,
	ring: false,
	borders: [],
	finding: null,
};

export const evidence = (parts: Partial<Evidence>): Evidence => ({ ...nothing, ...parts });

/** The name of what a proof shows, for the word that calls it up; null where there is nothing to show. */
export const evidenceWord: Record<Proof['kind'], string | null> = {
	'none-needed': null,
	edge: 'Show the border',
	'odd-cycle': 'Show the ring',
	clique: 'Show the regions',
	'odd-wheel': 'Show the ring',
	refutation: 'Show the regions',
	'not-proved': null,
};

export function proofEvidence(proof: Proof, words: string): Evidence {
	const wheel = proof.kind === 'odd-wheel';
	return evidence({
		words,
		hub: wheel ? proof.regions[0] : null,
		strong: wheel ? proof.regions.slice(1) : proof.regions,
		ring: wheel || proof.kind === 'odd-cycle',
	});
}

export function collisionEvidence(explanation: Explanation, words: string): Evidence {
	const locked = new Set(explanation.locks);
	return evidence({
		words,
		strong: explanation.locks,
		light: explanation.regions.filter((region) => !locked.has(region)),
	});
}
