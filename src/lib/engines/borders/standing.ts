import { borderKinds } from './border-list.ts';

/** What a sheet's rule says of each kind of border. */
export interface CountingRule {
	/** whether regions that meet in a point only must differ */
	pointTouches: boolean;
	/** a shared line shorter than this does not count, in metres; 0: every line does */
	leastMetres: number;
	/**
	 * pairs across water count up to this true gap, in kilometres; 0: none; null: those that were asked
	 * for when the file was read, and no others
	 */
	waterKm: number | null;
}

/** Whether a border of a sheet asks for two inks, or why it does not. */
export const standingNames = [
	'counts',
	'point-not-counted',
	'too-short',
	'too-far',
	'water-not-counted',
	'struck',
] as const;
export type Standing = (typeof standingNames)[number];

/**
 * The one place where a border as found counts or not: in, its kind (a code of `borderKinds`) and its
 * metres; out, its standing under the rule. Borders struck out and added are for the caller.
 */
export function standingUnder(rule: CountingRule, kind: number, metres: number): Standing {
	switch (borderKinds[kind]) {
		case 'line':
			return metres < rule.leastMetres ? 'too-short' : 'counts';
		case 'point':
			return rule.pointTouches ? 'counts' : 'point-not-counted';
		case 'water':
		case 'gap':
			return across(rule.waterKm, borderKinds[kind] === 'water', metres);
		default:
			return 'counts';
	}
}

function across(waterKm: number | null, asRead: boolean, metres: number): Standing {
	if (waterKm === null) return asRead ? 'counts' : 'water-not-counted';
	if (waterKm === 0) return 'water-not-counted';
	return metres <= waterKm * 1000 ? 'counts' : 'too-far';
}
