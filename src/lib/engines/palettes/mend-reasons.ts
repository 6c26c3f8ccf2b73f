import { contrast, labelInk } from '../colour/contrast.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { found } from './appearance.ts';
import { bestKnown } from './limits.ts';
import { askedFor, labelShortfall, type MendTask } from './mend-cost.ts';

/** Why no mend can exist, as a sentence, or null when nothing rules it out. Everything said is certain. */
export function whyImpossible(task: MendTask, locked: readonly number[]): string | null {
	return lockedLabel(task, locked) ?? lockedPair(task, locked) ?? tooMuchAsked(task);
}

function lockedLabel({ inks, names, label }: MendTask, locked: readonly number[]): string | null {
	const failing = locked.filter((ink) => labelShortfall(label, inks[ink]) > 0);
	if (failing.length === 0) return null;
	const [first] = failing;
	const best = contrast(inks[first], labelInk(inks[first]));
	return `${listed(failing.map((ink) => names[ink]))} ${failing.length === 1 ? 'is' : 'are'} locked, and a label reaches at most ${value(best)}:1 on ${names[first]} where ${label}:1 is asked`;
}

function lockedPair({ names, start, pairs }: MendTask, locked: readonly number[]): string | null {
	for (const ask of pairs) {
		const { a, b } = ask;
		if (!locked.includes(a) || !locked.includes(b)) continue;
		const reader = readers.find((one) => {
			const least = askedFor(ask, one);
			return least !== null && found(one, start[a], start[b]) < least;
		});
		if (!reader) continue;
		const both = `${names[a]} and ${names[b]} touch and are both locked, and they differ by ${value(found(reader, start[a], start[b]))}`;
		return reader === 'grey'
			? `${both} in L* in grey print where ${ask.grey} is asked`
			: `${both} in CIEDE2000 for ${reader} readers where ${ask.ciede2000} is asked`;
	}
	return null;
}

/** A label never passes 21:1, and inks that all touch share the 100 steps of L* between them. */
function tooMuchAsked(task: MendTask): string | null {
	if (task.label > 21) return 'No contrast is higher than 21:1, black on white';
	const all = mutualInks(task);
	const grey = least(task, all, 'grey');
	if (all.length < 2 || (all.length - 1) * grey <= 100) return null;
	return `${all.length} inks that all touch would need ${value((all.length - 1) * grey)} steps of L* for grey print, and there are 100`;
}

/** What to say when the search ended without a mend; it claims no more than that. */
export function whyNotFound(task: MendTask, locked: readonly number[]): string {
	const all = mutualInks(task);
	const best = bestKnown.get(all.length);
	const asked = least(task, all, 'typical');
	if (best !== undefined && asked > best) {
		return `${asked} is asked of ${all.length} inks that all touch; the best found for so many is ${best}`;
	}
	const size = `${task.inks.length} inks`;
	return `No set of ${size} was found that reaches what is asked${locked.length > 0 ? ' with these locks' : ''}; fewer inks, a lower demand, or a colouring that keeps the unsafe inks apart would help`;
}

/** The least that is asked for a reader of any two of these inks, 0 where hatches tell a pair apart. */
function least({ asks }: MendTask, inks: readonly number[], reader: Reader): number {
	const all = inks.flatMap((a) =>
		inks.filter((b) => b > a).map((b) => askedFor(asks[a][b], reader)),
	);
	return all.length ? Math.min(...all.map((one) => one ?? 0)) : 0;
}

/** Inks that touch each other pairwise: a large set, found greedily from every ink. */
export function mutualInks({ inks, neighbours }: MendTask): number[] {
	let largest: number[] = [];
	inks.forEach((_, first) => {
		const set = [first];
		for (const ink of neighbours[first]) {
			if (set.every((one) => neighbours[ink].includes(one))) set.push(ink);
		}
		if (set.length > largest.length) largest = set;
	});
	return largest;
}

function listed(names: readonly string[]): string {
	if (names.length < 2) return names.join();
	return `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
}

/** Rounded down, so that a value that fails is never shown as the value that was asked. */
function value(number: number): string {
	return (Math.floor(number * 100) / 100).toString();
}
