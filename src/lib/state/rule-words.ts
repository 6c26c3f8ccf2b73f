import type { RuleEntry, RuleKind } from '$lib/engines/editions/rule-list';
import { listed } from '$lib/engines/colouring/words';

/** What rules are called where they are listed. */
export const kindWords: Record<RuleKind, string> = {
	lock: 'Lock',
	'forbidden ink': 'Forbidden ink',
	'keep alike': 'Keep alike',
	'keep apart': 'Keep apart',
	'all alike': 'All alike',
	'all different': 'All different',
	'reserved ink': 'Reserved ink',
};

/** The same as counts: one, and several. */
export const kindCounts: Record<RuleKind, [one: string, many: string]> = {
	lock: ['lock', 'locks'],
	'forbidden ink': ['forbidden ink', 'forbidden inks'],
	'keep alike': ['pair kept alike', 'pairs kept alike'],
	'keep apart': ['pair kept apart', 'pairs kept apart'],
	'all alike': ['group all alike', 'groups all alike'],
	'all different': ['group all different', 'groups all different'],
	'reserved ink': ['reserved ink', 'reserved inks'],
};

export interface RuleNames {
	region: (key: string) => string;
	ink: (ink: number) => string;
	/** name of an adjoining sheet by its number */
	sheet: (number: number) => string;
}

/** A rule in one plain sentence without a full stop. */
export function ruleWords(rule: RuleEntry, names: RuleNames): string {
	const [a, b] = rule.keys.slice(0, 2).map(names.region);
	const ink = rule.ink === null ? '' : names.ink(rule.ink);
	switch (rule.kind) {
		case 'lock':
			return `${a} is locked to ${ink}${weightWords(rule.weight)}`;
		case 'forbidden ink':
			return `${a} may not have ${ink}`;
		case 'keep alike':
			return `${a} and ${b} are kept alike`;
		case 'keep apart':
			return `${a} and ${b} are kept apart`;
		case 'all alike':
			return `all ${rule.keys.length} regions of ${rule.group} are alike`;
		case 'all different':
			return `all ${rule.keys.length} regions of ${rule.group} differ from each other`;
		case 'reserved ink':
			return `${ink} is reserved for regions locked to it`;
	}
}

const weightWords = (weight: number | null) =>
	weight === null || weight === 1 ? '' : `, weight ${weight}`;

/** The regions of a rule by name; of many the first ones and how many more. */
export const regionsOfRule = ({ keys }: RuleEntry, { region }: RuleNames): string =>
	keys.length === 0 ? 'every region' : listed(keys.map(region), 6);
