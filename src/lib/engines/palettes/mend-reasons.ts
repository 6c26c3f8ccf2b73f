import { contrast, labelInk } from '../colour/contrast.ts';
import { readers } from '../colour/reader.ts';
import { found } from './appearance.ts';
import { bestKnown } from './limits.ts';
import { labelShortfall, shortfall, type MendTask } from './mend-cost.ts';

/** Why no mend can exist, as a sentence, or null when nothing rules it out. Everything said is certain. */
export function whyImpossible(task: MendTask, locked: readonly number[]): string | null {
	return lockedLabel(task, locked) ?? lockedPair(task, locked) ?? tooMuchAsked(task);
}

function lockedLabel({ inks, asked }: MendTask, locked: readonly number[]): string | null {
	const failing = locked.filter((ink) => labelShortfall(asked, inks[ink]) > 0).map((i) => inks[i]);
	if (failing.length === 0) return null;
	const best = contrast(failing[0], labelInk(failing[0]));
	return `${listed(failing)} ${failing.length === 1 ? 'is' : 'are'} locked, and a label reaches at most ${value(best)}:1 on ${failing[0]} where ${asked.label}:1 is asked`;
}

function lockedPair(task: MendTask, locked: readonly number[]): string | null {
	const { inks, asked, start, neighbours } = task;
	for (const a of locked) {
		for (const b of neighbours[a].filter((other) => locked.includes(other))) {
			if (shortfall(asked, start[a], start[b]) === 0) continue;
			const reader = readers.find(
				(one) => found(one, start[a], start[b]) < (one === 'grey' ? asked.grey : asked.ciede2000),
			);
			if (!reader) continue;
			const both = `${inks[a]} and ${inks[b]} touch and are both locked, and they differ by ${value(found(reader, start[a], start[b]))}`;
			return reader === 'grey'
				? `${both} in L* in grey print where ${asked.grey} is asked`
				: `${both} in CIEDE2000 for ${reader} readers where ${asked.ciede2000} is asked`;
		}
	}
	return null;
}

/** A label never passes 21:1, and inks that all touch share the 100 steps of L* between them. */
function tooMuchAsked(task: MendTask): string | null {
	if (task.asked.label > 21) return 'No contrast is higher than 21:1, black on white';
	const all = mutualInks(task).length;
	if (all < 2 || (all - 1) * task.asked.grey <= 100) return null;
	return `${all} inks that all touch would need ${value((all - 1) * task.asked.grey)} steps of L* for grey print, and there are 100`;
}

/** What to say when the search ended without a mend; it claims no more than that. */
export function whyNotFound(task: MendTask, locked: readonly number[]): string {
	const all = mutualInks(task).length;
	const best = bestKnown.get(all);
	if (best !== undefined && task.asked.ciede2000 > best) {
		return `${task.asked.ciede2000} is asked of ${all} inks that all touch; the best found for so many is ${best}`;
	}
	const size = `${task.inks.length} inks`;
	return `No set of ${size} was found that reaches what is asked${locked.length > 0 ? ' with these locks' : ''}; fewer inks, a lower demand, or a colouring that keeps the unsafe inks apart would help`;
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

function listed(hexes: readonly string[]): string {
	if (hexes.length < 2) return hexes.join();
	return `${hexes.slice(0, -1).join(', ')} and ${hexes[hexes.length - 1]}`;
}

/** Rounded down, so that a value that fails is never shown as the value that was asked. */
function value(number: number): string {
	return (Math.floor(number * 100) / 100).toString();
}
