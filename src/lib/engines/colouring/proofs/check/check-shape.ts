import type { ProofFile, ShapeEvidence } from '../proof-form.ts';
import { limits } from './limits.ts';
import { pairsWithin, type Touching } from './pairs-within.ts';

/** What a shape needs, or what is wrong with it. */
export type Needed = { inks: number } | { fault: string; gaveUp?: boolean };

/** How many inks the regions of a shape need, if it is that shape. */
export function shapeNeeds(file: ProofFile, { kind, regions }: ShapeEvidence): Needed {
	if (kind === 'one region') {
		return regions.length === 1 ? { inks: 1 } : { fault: 'no single region is named.' };
	}
	const touching = pairsWithin(file, regions);
	if (kind === 'clique') return clique(regions, touching);
	const rim = kind === 'odd wheel' ? regions.slice(1) : regions;
	if (rim.length < 3 || rim.length % 2 === 0) return { fault: 'the ring is not of odd length.' };
	const open = rim.some((region, i) => !touching.has(region, rim[(i + 1) % rim.length]));
	if (open) return { fault: 'two regions that follow each other in the ring do not border.' };
	if (kind === 'odd ring') return { inks: 3 };
	const loose = rim.some((region) => !touching.has(regions[0], region));
	return loose ? { fault: 'a region of the ring does not border the middle one.' } : { inks: 4 };
}

function clique(regions: readonly number[], touching: Touching): Needed {
	const pairs = (regions.length * (regions.length - 1)) / 2;
	if (pairs > limits.cliquePairs) return { fault: 'too many regions are named.', gaveUp: true };
	if (touching.count < pairs) return { fault: 'two of the regions do not border.' };
	return { inks: regions.length };
}
