import type { DeskFinding } from '$lib/schemas/desk';

export const severityWords = { error: 'Error', warning: 'Warning', note: 'Note' };

/** Kinds of finding as one and as several; a kind without words of its own is called by its code. */
const kinds: Record<string, [string, string]> = {
	sliver: ['sliver', 'slivers'],
	gap: ['gap', 'gaps'],
	overlap: ['overlap', 'overlaps'],
	'duplicate-region': ['region that is there twice', 'regions that are there twice'],
	'self-crossing': ['outline that crosses itself', 'outlines that cross themselves'],
	'stray-part': ['stray part', 'stray parts'],
	'unmatched-borders': ['border drawn twice', 'borders drawn twice'],
	'tolerance-joined': ['border joined within the tolerance', 'borders joined within the tolerance'],
	'vertices-joined': ['border matched', 'borders matched'],
	'pairs-gained': ['pair gained', 'pairs gained'],
	'pairs-lost': ['pair lost', 'pairs lost'],
	'ring-closed': ['outline closed', 'outlines closed'],
	'ring-turned': ['outline turned', 'outlines turned'],
	'ring-collapsed': ['outline left out', 'outlines left out'],
	'corner-doubled': ['doubled corner', 'doubled corners'],
};

export const kindWords = (code: string, many = false): string =>
	kinds[code]?.[many ? 1 : 0] ?? code.replaceAll('-', ' ');

/** Wider ones are better mended one by one than by a tolerance that reaches every border, in metres. */
const mostForSlivers = 20;

/** Findings that speak of borders which are not the same line on both sides. */
const ofTolerance = new Set(['unmatched-borders', 'near-misses', 'borders-apart', 'sliver']);

/**
 * Metres within which joining would mend what a finding speaks of, where it says so: the first figure in
 * metres of a finding about borders that were drawn twice; null where there is none.
 */
export function joinMetres({
	code,
	message,
}: Pick<DeskFinding, 'code' | 'message'>): number | null {
	if (!ofTolerance.has(code)) return null;
	const metres = /([\d.,]+) (m|cm) (?:apart|or less|wide)/.exec(message);
	if (!metres) return null;
	const value = Number(metres[1].replaceAll(',', '')) / (metres[2] === 'cm' ? 100 : 1);
	if (!(value > 0)) return null;
	// a sliver is at its widest about twice as wide as on average; the slack is for the rounding
	const reach = code === 'sliver' ? 2.5 * value : value;
	if (code === 'sliver' && reach > mostForSlivers) return null;
	return reach < 1 ? Math.ceil(reach * 10) / 10 : Math.ceil(reach);
}
