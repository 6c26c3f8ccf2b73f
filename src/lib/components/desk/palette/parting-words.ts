import type { Rule } from '$lib/engines/colouring/problem';
import type { Unparted } from '$lib/state/parting.svelte';
import { counted } from '../../format';

type Name = (number: number) => string;

/** Why unsafe inks cannot be kept from touching, and what would help, in plain sentences. */
export function unpartedWords(
	unparted: Unparted,
	pairs: string,
	nameOf: Name,
	inkName: Name,
): string {
	if (unparted.status === 'undecided') return unparted.message;
	const { locks, rules, inks, inksThatWouldDo } = unparted;
	const more =
		inksThatWouldDo === null
			? ''
			: ` With ${counted(inksThatWouldDo, 'ink')} it can be done, every lock and rule kept.`;
	if (locks.length + rules.length === 0)
		return `With ${counted(inks, 'ink')} they must touch: the borders of this sheet alone force it (${pairs}).${more}`;
	const blamed = [
		...(locks.length ? [locksWords(locks, nameOf)] : []),
		...rules.slice(0, 6).map((rule) => ruleWords(rule, nameOf, inkName)),
		...(rules.length > 6 ? [`${rules.length - 6} more rules`] : []),
	];
	return `With ${counted(inks, 'ink')} they must touch, because of ${listed(blamed)}; without any one of these they need not (${pairs}).${more}`;
}

function locksWords(locks: readonly number[], nameOf: Name): string {
	const names = locks.slice(0, 8).map(nameOf);
	if (locks.length > 8) names.push(`${locks.length - 8} more`);
	return `${locks.length === 1 ? 'the lock' : 'the locks'} of ${listed(names)}`;
}

function ruleWords(rule: Rule, nameOf: Name, inkName: Name): string {
	switch (rule.kind) {
		case 'forbidden':
			return `${inkName(rule.ink)} being forbidden for ${nameOf(rule.region)}`;
		case 'reserved':
			return `${inkName(rule.ink)} being reserved`;
		case 'alike':
			return `${nameOf(rule.a)} and ${nameOf(rule.b)} being kept alike`;
		case 'apart':
			return `${nameOf(rule.a)} and ${nameOf(rule.b)} being kept apart`;
		case 'border':
			return `the border between ${nameOf(rule.a)} and ${nameOf(rule.b)}`;
		case 'inks':
			return `only ${counted(rule.inks, 'ink')} being allowed`;
	}
}

function listed(words: readonly string[]): string {
	if (words.length < 2) return words.join();
	return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
