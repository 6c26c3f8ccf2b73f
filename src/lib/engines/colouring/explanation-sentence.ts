import type { Explanation, Release, Rule } from './problem.ts';
import { counted, listed } from './words.ts';

type Name = (number: number) => string;

/**
 * Why the rules cannot all be kept and what would help, in plain sentences. `nameOf` names regions,
 * `inkName` inks; names are put in as they are, so the caller escapes where it matters.
 */
export function explanationSentence(explanation: Explanation, nameOf: Name, inkName: Name): string {
	const { locks, rules, release, inksThatWouldDo } = explanation;
	return [
		locks.length > 0 ? lockSentence(explanation, nameOf) : ruleSentence(rules, nameOf, inkName),
		release ? releaseSentence(release, nameOf) : '',
		inksThatWouldDo === null
			? ''
			: `With ${counted(inksThatWouldDo, 'ink')} all rules can be kept.`,
	]
		.filter((sentence) => sentence !== '')
		.join(' ');
}

function lockSentence({ locks, inksThatWouldDo }: Explanation, nameOf: Name): string {
	const names = listed(locks.map(nameOf));
	if (locks.length === 1)
		return `The lock of ${names} cannot be kept together with the other rules.`;
	if (locks.length === 2 && inksThatWouldDo === null)
		return `${names} cannot both keep their locks, whatever the number of inks.`;
	return `The locks of ${names} cannot all be kept, though without any one of them the others can.`;
}

function ruleSentence(rules: Rule[], nameOf: Name, inkName: Name): string {
	if (rules.length === 0) return 'The rules cannot all be kept.';
	const borders = rules.filter(({ kind }) => kind === 'border').length;
	const others = rules.filter(({ kind }) => kind !== 'border');
	const parts = others.map((rule) => oneRule(rule, nameOf, inkName));
	if (borders > 0 && borders <= 3) {
		parts.push(...rules.filter((r) => r.kind === 'border').map((r) => oneRule(r, nameOf, inkName)));
	} else if (borders > 3) parts.push(`${counted(borders, 'border')} between them`);
	return `These rules cannot all be kept: ${listed(parts)}.`;
}

function oneRule(rule: Rule, nameOf: Name, inkName: Name): string {
	switch (rule.kind) {
		case 'border':
			return `the border between ${nameOf(rule.a)} and ${nameOf(rule.b)}`;
		case 'alike':
			return `keep ${nameOf(rule.a)} and ${nameOf(rule.b)} alike`;
		case 'apart':
			return `keep ${nameOf(rule.a)} and ${nameOf(rule.b)} apart`;
		case 'forbidden':
			return `${inkName(rule.ink)} forbidden for ${nameOf(rule.region)}`;
		case 'reserved':
			return `${inkName(rule.ink)} reserved, and ${nameOf(rule.region)} not locked to it`;
		case 'inks':
			return `only ${counted(rule.inks, 'ink')}`;
	}
}

function releaseSentence(release: Release, nameOf: Name): string {
	const names = listed(release.locks.map(nameOf));
	const locks = release.locks.length === 1 ? 'the lock' : 'the locks';
	const way = `Dropping ${locks} of ${names} makes it possible`;
	if (release.proved) return `${way}; nothing cheaper would.`;
	return `${way}; it costs ${release.cost}, and a way out costs ${release.lowerBound} at least.`;
}
