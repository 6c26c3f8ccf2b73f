import type { GoalKind, GoalWish } from '../colouring/goal-wish.ts';
import { canonicalJson } from './canonical-json.ts';
import { wholeDraft, type Draft, type EdgeTie, type GroupRule, type HandBorder } from './draft.ts';

/**
 * The rules of a draft as members that can be compared one by one, each named by what it is about and
 * holding what it says. Who set a lock, or struck a border, and when is no part of the rule. A draft
 * written before a rule could be said has it as it was then.
 */
export function rulesCompared(stored: Draft): Record<string, unknown> {
	const draft = wholeDraft(stored);
	const { inks, locks, pointTouches, leastMetres, waterKm } = draft;
	return {
		inks,
		pointTouches,
		'shortest line that counts (m)': leastMetres,
		'widest gap that counts (km)': waterKm,
		...members(Object.entries(locks), ([key]) => `lock ${key}`, bareLock),
		...listed('forbidden', draft.forbidden),
		...listed('alike', draft.alike),
		...listed('apart', draft.apart),
		...members(draft.groups, groupName, ({ keys }) => [...keys].sort()),
		...members(
			draft.reserved,
			(ink) => `ink ${ink} reserved`,
			() => true,
		),
		goals: draft.goals.map(aimInWords),
		...members(draft.ties, (tie) => `tie to sheet ${tie.sheet}`, tieWords),
		...listed('struck', draft.struck.map(unsigned)),
		...listed('added', draft.added.map(unsigned)),
	};
}

/** A list as members named by what they say, so that its order does not count. */
const listed = (name: string, entries: unknown[]) =>
	members(
		entries,
		(entry) => `${name} ${canonicalJson(entry)}`,
		(entry) => entry,
	);

const members = <T>(
	entries: readonly T[],
	name: (entry: T) => string,
	says: (entry: T) => unknown,
): Record<string, unknown> =>
	Object.fromEntries(entries.map((entry) => [name(entry), says(entry)]));

const bareLock = ([, { ink, cost, tie }]: [string, Draft['locks'][string]]) =>
	tie === undefined ? { ink, cost } : { ink, cost, tie };

const unsigned = ({ a, b, reason }: HandBorder) => ({ a, b, reason });

const groupName = ({ kind, name }: GroupRule) =>
	`all of “${name}” ${kind === 'alike' ? 'kept alike' : 'different'}`;

const goalWords: Record<GoalKind, string> = {
	'fewest-changes': 'fewest changes',
	'even-count': 'even use by count',
	'even-area': 'even use by area',
	distinct: 'distinct neighbours',
	'same-ink-apart': 'same ink far apart',
};

const aimInWords = ({ kind, give, readers, against }: GoalWish): string =>
	goalWords[kind] +
	(readers ? ` for ${readers.join(', ')} readers` : '') +
	(against
		? ` against ${'edition' in against ? 'edition' : 'revision'} ${Object.values(against)[0]}`
		: '') +
	givesWords(give);

const givesWords = (give: number) =>
	give === 0 ? '' : `, of which later goals may take ${Number((100 * give).toFixed(1))} %`;

const tieWords = ({ name, edition, revision }: EdgeTie) =>
	`“${name}”, ${edition === null ? 'the draft' : `edition ${edition}`}, revision ${revision}`;
