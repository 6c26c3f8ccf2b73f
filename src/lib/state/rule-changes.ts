import { canonicalJson } from '$lib/engines/editions/canonical-json';
import type { Draft } from '$lib/engines/editions/draft';
import { ruleList, type RuleEntry } from '$lib/engines/editions/rule-list';

/** What becomes of the rules when one draft takes the place of another. */
export interface RuleChanges {
	added: RuleEntry[];
	/** as they will be */
	changed: RuleEntry[];
	removed: RuleEntry[];
}

/** Rules are told apart by what they are about; changed are those that say something else of it. */
export function ruleChanges(before: Draft, after: Draft): RuleChanges {
	const old = new Map(ruleList(before).map((rule) => [rule.id, rule]));
	const now = ruleList(after);
	const kept = new Set(now.map(({ id }) => id));
	return {
		added: now.filter(({ id }) => !old.has(id)),
		changed: now.filter((rule) => {
			const known = old.get(rule.id);
			return known !== undefined && sense(known) !== sense(rule);
		}),
		removed: [...old.values()].filter(({ id }) => !kept.has(id)),
	};
}

const sense = ({ keys, ink, weight }: RuleEntry) => canonicalJson([[...keys].sort(), ink, weight]);
