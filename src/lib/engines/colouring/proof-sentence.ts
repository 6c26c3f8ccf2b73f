import type { ColouringResult } from './problem.ts';
import { capital, counted, listed } from './words.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/**
 * Why no fewer inks do, as one or two plain sentences. `nameOf` gives the name of a region; names are
 * put in as they are, so the caller escapes where it matters.
 */
export function proofSentence(result: Coloured, nameOf: (region: number) => string): string {
	const { proof, inksUsed, lowerBound } = result;
	const names = proof.regions.map(nameOf);
	const needed = `${capital(counted(inksUsed, 'ink'))} ${inksUsed === 1 ? 'is' : 'are'} needed because`;
	switch (proof.kind) {
		case 'none-needed':
			return inksUsed === 0
				? 'There is nothing to colour.'
				: 'No two regions must differ: one ink does.';
		case 'edge':
			return `${needed} ${listed(names)} border.`;
		case 'odd-cycle':
			return `${needed} ${counted(names.length, 'region')} form a ring of odd length: ${listed(names)}.`;
		case 'clique':
			return `${needed} ${listed(names)} all border each other.`;
		case 'odd-wheel': {
			const [hub, ...rim] = names;
			const ring = `${counted(rim.length, 'region')} round ${hub} form a ring of odd length`;
			return `${needed} ${ring}: ${listed(rim)}.`;
		}
		case 'refutation': {
			const inks = counted(inksUsed - 1, 'ink');
			const cannot = `the ${counted(names.length, 'region')} named here cannot be coloured with ${inks}`;
			return `${needed} ${cannot}; every step of that was replayed: ${listed(names)}.`;
		}
		case 'not-proved':
			return openSentence(inksUsed, lowerBound);
	}
}

function openSentence(inksUsed: number, lowerBound: number): string {
	const used = `${capital(counted(inksUsed, 'ink'))} ${inksUsed === 1 ? 'does' : 'do'}.`;
	const fewer = lowerBound < inksUsed ? ` At least ${counted(lowerBound, 'ink')} are needed` : '';
	return fewer
		? `${used}${fewer}; whether fewer than ${inksUsed} would do was not settled.`
		: `${used} No fewer were found to do, but there is no proof to show.`;
}
