import type { Fault } from './read-values.ts';
import type { MapRules } from './map-rules.ts';

/** The first border or rule that a colouring breaks, in words; null when it keeps them all. */
export function colouringFault(
	{ file, lock, barred }: MapRules,
	ink: readonly number[],
	nameOf: (region: number) => string,
): Fault {
	const { borders, rules } = file;
	const both = (a: number, b: number) => `${nameOf(a)} and ${nameOf(b)}`;
	for (const [a, b] of borders) {
		if (ink[a] === ink[b]) return `${both(a, b)} border and have the same ink.`;
	}
	for (const [a, b] of rules.apart) {
		if (ink[a] === ink[b]) return `${both(a, b)} are to be kept apart and have the same ink.`;
	}
	for (const [a, b] of rules.alike) {
		if (ink[a] !== ink[b]) return `${both(a, b)} are to be kept alike and have different inks.`;
	}
	for (const [region, locked] of lock) {
		if (ink[region] !== locked) return `${nameOf(region)} does not have the ink it is locked to.`;
	}
	for (const [region, bad] of rules.forbidden) {
		if (ink[region] === bad) return `${nameOf(region)} has an ink that is forbidden for it.`;
	}
	const stolen = ink.findIndex((each, region) => barred(region, each));
	return stolen < 0 ? null : `${nameOf(stolen)} has a reserved ink.`;
}
