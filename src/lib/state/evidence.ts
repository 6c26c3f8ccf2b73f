import type { BorderList } from '$lib/engines/borders/border-list';
import type { Explanation, Proof } from '$lib/engines/colouring/problem';
import { bordersOn } from './planarity-words';

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
	/** regions marked by a dot: many at once, whose outlines would hide the sheet */
	dots: readonly number[];
	/** the middle that every region of the ring touches */
	hub: number | null;
	ring: boolean;
	/** whether all other regions step back */
	alone: boolean;
	/** numbers into the sheet's border list */
	borders: readonly number[];
	/** path on the drawn sheet that is traced, '' for none */
	outline: string;
	/** number of the finding whose place is marked */
	finding: number | null;
	/** what is written on regions; the name is left out where there is little room */
	tags: readonly Tag[];
	/** whether the sheet is moved so that all of it is seen well */
	framed: boolean;
}

export interface Tag {
	region: number;
	name: string;
	text: string;
}

const nothing: Evidence = {
	words: '',
	strong: [],
	light: [],
	dots: [],
	hub: null,
	ring: false,
	alone: false,
	borders: [],
	outline: '',
	finding: null,
	tags: [],
	framed: false,
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

export function proofEvidence(
	proof: Proof,
	nameOf: (region: number) => string,
	list: Pick<BorderList, 'a' | 'b'>,
): Evidence {
	const wheel = proof.kind === 'odd-wheel';
	return evidence({
		words: proofWords(proof, nameOf),
		hub: wheel ? proof.regions[0] : null,
		strong: wheel ? proof.regions.slice(1) : proof.regions,
		ring: wheel || proof.kind === 'odd-cycle',
		alone: true,
		borders: proof.kind === 'refutation' ? bordersOn(neededPairs(proof, list), list) : [],
	});
}

/** The borders a refuted part needs; where it needs all of its own, those. */
function neededPairs({ regions, borders }: Proof, { a, b }: Pick<BorderList, 'a' | 'b'>) {
	if (borders) return borders;
	const inside = new Set(regions);
	return Array.from(a, (p, i) => [p, b[i]]).filter(([p, q]) => inside.has(p) && inside.has(q));
}

function proofWords({ kind, regions, borders }: Proof, nameOf: (region: number) => string): string {
	const many = regions.length;
	if (kind === 'odd-wheel') return `A ring of ${many - 1} regions round ${nameOf(regions[0])}`;
	if (kind === 'odd-cycle') return `A ring of ${many} regions`;
	if (kind === 'clique') return `${many} regions that all border each other`;
	const lines = borders ? `, and the ${borders.length} borders among them that it takes` : '';
	return `The ${many} regions that make it necessary${lines}`;
}

/** The locks that collide, each with its ink, and the regions between them, brought into view. */
export function collisionEvidence(
	{ locks, regions }: Explanation,
	tagOf: (region: number) => Omit<Tag, 'region'>,
): Evidence {
	const locked = new Set(locks);
	const between = regions.filter((region) => !locked.has(region));
	return evidence({
		words: collisionWords(locks.length, between.length),
		strong: locks,
		light: between,
		tags: locks.slice(0, mostTags).map((region) => ({ region, ...tagOf(region) })),
		framed: true,
	});
}

/** More names than these would hide what they name. */
const mostTags = 12;

function collisionWords(locks: number, between: number): string {
	if (locks === 0) return 'Dashed outline: the regions whose rules collide.';
	const solid = `Solid outline: the ${locks === 1 ? 'lock' : 'locks'} in the way.`;
	return between === 0 ? solid : `${solid} Dashed outline: the regions between.`;
}

/** Regions that would have another ink; more than these are counted only. */
const mostOutlined = 400;

export function changeEvidence(regions: readonly number[]): Evidence {
	const many = regions.length;
	if (many === 0) return evidence({ words: 'No region changes ink.' });
	const said = many === 1 ? 'the region that changes ink' : `the ${many} regions that change ink`;
	if (many > mostOutlined) return evidence({ words: `${many} regions change ink.` });
	return evidence({ words: `Dashed outline: ${said}.`, light: regions });
}
