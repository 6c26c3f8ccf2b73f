import type { Explanation } from '$lib/engines/colouring/problem';
import { lockSource, ruleSources, type SourceGround } from '$lib/engines/editions';
import type { Draft } from '$lib/engines/editions/draft';
import { counted } from '$lib/components/format';
import { release, useInks } from '../draft-edits';
import { rulesAmong } from './rules-among';
import { releaseNote, weightWords, type Way } from './way';

/** More single locks or rules than these are not offered: nobody compares so many. */
const most = 8;
const namesShown = 4;
/** as many as a palette may have */
const mostInks = 64;

/**
 * The ways out of a collision, side by side: the cheapest release, more inks, each rule that has a part in
 * it, each single lock of those that collide. Whether one works is not known yet, except where the bound on
 * every release already says no.
 */
export function listWays(explanation: Explanation, draft: Draft, ground: SourceGround): Way[] {
	return [
		...cheapest(explanation, draft, ground),
		...moreInks(explanation),
		...rules(explanation, draft, ground),
		...singleLocks(explanation, draft, ground),
	];
}

function cheapest({ release: found }: Explanation, draft: Draft, ground: SourceGround): Way[] {
	if (!found || found.locks.length === 0) return [];
	const names = listed(found.locks.map((region) => nameOf(ground, region)));
	const tied = found.locks.filter((region) => draft.locks[ground.keys[region]]?.tie !== undefined);
	const ties = tied.length
		? ` ${counted(tied.length, 'lock')} of them an adjoining sheet asks for.`
		: '';
	return [
		{
			id: `release ${found.locks.join()}`,
			kind: 'release',
			gives: `Release ${names}`,
			weight: found.cost,
			note: releaseNote(found) + ties,
			label:
				found.locks.length > namesShown
					? `release ${counted(found.locks.length, 'lock')}`
					: `release ${names}`,
			change: release(found.locks.map((region) => ground.keys[region])),
			hopeless: '',
		},
	];
}

function moreInks({ inksThatWouldDo: inks }: Explanation): Way[] {
	if (inks === null) return [];
	return [
		{
			id: 'inks',
			kind: 'inks',
			gives: `Use ${counted(inks, 'ink')}`,
			weight: null,
			note: 'Every lock and rule stays.',
			label: `use ${counted(inks, 'ink')}`,
			change: useInks(inks),
			hopeless: inks > mostInks ? `A sheet has ${mostInks} inks at most.` : '',
		},
	];
}

/** A rule is dropped with everything that says it; a border of the file is no rule of the draft. */
function rules(explanation: Explanation, draft: Draft, ground: SourceGround): Way[] {
	const blamed =
		explanation.locks.length > 0
			? rulesAmong(explanation.regions, draft, ground.keys)
			: explanation.rules;
	const ways = new Map<string, Way>();
	for (const rule of blamed) {
		const sources = ruleSources(draft, ground, rule);
		if (sources.length === 0 || sources.some(({ kind }) => kind === 'file-border')) continue;
		const words = sources.map((source) => source.words).join(', and ');
		ways.set(words, {
			id: `rule ${words}`,
			kind: 'rule',
			gives: `Drop the rule that ${words}`,
			weight: null,
			note: '',
			label: `drop the rule that ${words}`,
			change: (from) => sources.reduce((left, { drop }) => drop(left), from),
			hopeless: '',
		});
	}
	return [...ways.values()].slice(0, most);
}

function singleLocks(explanation: Explanation, draft: Draft, ground: SourceGround): Way[] {
	const { locks, release: found } = explanation;
	const alone = found?.locks.length === 1;
	const least = found?.lowerBound ?? 0;
	return locks
		.filter((region) => !alone || region !== found.locks[0])
		.slice(0, most)
		.map((region) => {
			const key = ground.keys[region];
			const source = lockSource(draft, ground, region);
			const weight = draft.locks[key]?.cost ?? 1;
			const name = nameOf(ground, region);
			return {
				id: `lock ${key}`,
				kind: 'lock',
				gives: `Release ${name}${alone ? '' : ' alone'}`,
				weight,
				note: source?.kind === 'tie' ? `${source.words}.` : '',
				label: `release ${name}`,
				change: release([key]),
				hopeless:
					weight < least * (1 - 1e-9)
						? `Not enough: locks of weight ${weightWords(least)} at least have to go.`
						: '',
			} satisfies Way;
		});
}

const nameOf = ({ keys, names }: SourceGround, region: number) => names?.[region] || keys[region];

function listed(names: readonly string[]): string {
	const shown = names.slice(0, namesShown);
	if (names.length > namesShown) return `${shown.join(', ')} and ${names.length - namesShown} more`;
	return names.length > 1 ? `${shown.slice(0, -1).join(', ')} and ${names.at(-1)}` : shown.join('');
}
