import { limits } from './limits.ts';
import {
	fieldFault,
	isRecord,
	isWhole,
	listFault,
	pairsFault,
	quoted,
	regionsFault,
	type Fault,
} from './read-values.ts';

type Fields = Record<string, unknown>;

/** What is wrong with the form of a claim; null when it can be looked at. */
export function readClaim(claim: unknown, at: string, regions: number): Fault {
	if (!isRecord(claim) || !Object.hasOwn(claim, 'claim')) return `${at} is no claim.`;
	switch (claim.claim) {
		case 'inks do':
			return (
				fieldFault(claim, at, ['claim', 'inks', 'colouring']) ??
				inksFault(claim, at) ??
				colouringFault(claim, at, regions)
			);
		case 'inks do not':
			return (
				fieldFault(claim, at, ['claim', 'inks', 'evidence']) ??
				inksFault(claim, at) ??
				evidenceFault(claim.evidence, at, regions)
			);
		case 'cannot be kept':
			return (
				fieldFault(claim, at, ['claim', 'inks', 'locks', 'evidence']) ??
				(claim.inks === 'any' ? null : inksFault(claim, at)) ??
				regionsFault(claim.locks, `${at} its locks`, regions) ??
				(isRecord(claim.evidence) && claim.evidence.kind === 'clauses'
					? evidenceFault(claim.evidence, at, regions)
					: `${at} has no clauses as evidence.`)
			);
		case 'works without':
			return (
				fieldFault(claim, at, ['claim', 'inks', 'locks', 'colouring']) ??
				inksFault(claim, at) ??
				regionsFault(claim.locks, `${at} its locks`, regions) ??
				colouringFault(claim, at, regions)
			);
		default:
			return `${at} claims “${quoted(String(claim.claim))}”, which this form does not know.`;
	}
}

const inksFault = ({ inks }: Fields, at: string): Fault =>
	isWhole(inks, limits.inks + 1) ? null : `${at} gives no proper number of inks.`;

function colouringFault({ colouring, inks }: Fields, at: string, regions: number): Fault {
	const fault = listFault(colouring, `${at} its colouring`, limits.regions, (ink, where) =>
		isWhole(ink, inks as number) ? null : `${where} is none of the inks.`,
	);
	if (fault) return fault;
	const given = (colouring as unknown[]).length;
	return given === regions ? null : `${at} colours ${given} regions, not ${regions}.`;
}

const shapes: readonly unknown[] = ['one region', 'clique', 'odd ring', 'odd wheel'];

function evidenceFault(evidence: unknown, at: string, regions: number): Fault {
	if (!isRecord(evidence)) return `${at} has no evidence.`;
	const place = `${at} its evidence`;
	if (shapes.includes(evidence.kind)) {
		return (
			fieldFault(evidence, place, ['kind', 'regions']) ??
			regionsFault(evidence.regions, place, regions)
		);
	}
	if (evidence.kind !== 'clauses') return `${place} is of no kind that this form knows.`;
	return (
		fieldFault(evidence, place, ['kind', 'regions', 'inks', 'format', 'clauses'], ['borders']) ??
		regionsFault(evidence.regions, place, regions) ??
		evidenceInksFault(evidence.inks, place) ??
		(Object.hasOwn(evidence, 'borders')
			? pairsFault(evidence.borders, `${place}, its borders`, [regions, regions], false)
			: null) ??
		(evidence.format === 'drup' && typeof evidence.clauses === 'string'
			? null
			: `${place} has no clauses in the DRUP form.`)
	);
}

function evidenceInksFault(inks: unknown, place: string): Fault {
	const seen = new Set<unknown>();
	return listFault(inks, `${place}, its inks`, limits.inks, (ink, at) => {
		if (!isWhole(ink, limits.inks) || seen.has(ink)) return `${at} is no ink, or one named twice.`;
		seen.add(ink);
		return null;
	});
}
