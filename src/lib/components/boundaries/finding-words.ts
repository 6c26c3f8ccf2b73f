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
