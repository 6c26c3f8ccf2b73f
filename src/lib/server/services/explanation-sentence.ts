import type { Explanation, Rule } from '../../engines/colouring/index.ts';

/** Names listed in full before the rest are counted. */
const mostNamed = 4;

/** Why there is no colouring and what would help, in plain sentences; `names` by region number. */
export function explanationSentence(found: Explanation, names: readonly string[]): string {
	return [because(found, names), release(found, names), moreInks(found)]
		.filter((part) => part !== null)
		.join(' ');
}

function because({ locks, rules }: Explanation, names: readonly string[]): string {
	if (locks.length === 1) {
		return `The lock of ${names[locks[0]]} cannot be kept with the other rules.`;
	}
	if (locks.length > 1) return `The locks of ${listed(locks, names)} cannot all be kept.`;
	if (rules.length === 0) return 'The rules cannot all be kept.';
	return `These rules cannot all be kept: ${limited(
		rules.map((rule) => ruleInWords(rule, names)),
		'; ',
	)}.`;
}

function release({ release: found }: Explanation, names: readonly string[]): string | null {
	if (!found || found.locks.length === 0) return null;
	const which = found.locks.length === 1 ? 'the lock' : 'the locks';
	const cheapest = found.proved ? ', and nothing cheaper does' : '';
	return `Dropping ${which} of ${listed(found.locks, names)} frees the rest${cheapest}.`;
}

const moreInks = ({ inksThatWouldDo }: Explanation): string | null =>
	inksThatWouldDo === null ? null : `With ${inksThatWouldDo} inks everything could be kept.`;

function ruleInWords(rule: Rule, names: readonly string[]): string {
	switch (rule.kind) {
		case 'border':
			return `${names[rule.a]} borders ${names[rule.b]}`;
		case 'alike':
			return `${names[rule.a]} is kept like ${names[rule.b]}`;
		case 'apart':
			return `${names[rule.a]} is kept apart from ${names[rule.b]}`;
		case 'forbidden':
			return `ink ${rule.ink + 1} is forbidden for ${names[rule.region]}`;
		case 'inks':
			return `there are ${rule.inks} inks`;
	}
}

const listed = (regions: readonly number[], names: readonly string[]): string =>
	limited(
		regions.map((region) => names[region]),
		', ',
	);

/** "a, b and c", or the first few and how many more there are. */
function limited(parts: readonly string[], comma: string): string {
	if (parts.length === 1) return parts[0];
	if (parts.length <= mostNamed) return `${parts.slice(0, -1).join(comma)} and ${parts.at(-1)}`;
	return `${parts.slice(0, mostNamed).join(comma)} and ${parts.length - mostNamed} more`;
}
