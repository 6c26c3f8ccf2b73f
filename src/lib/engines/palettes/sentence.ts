import type { BorderList } from '../borders/border-list.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { alikeBelow } from './demand.ts';
import type { Ink, PaletteVerdict, WeakBorder } from './palette.ts';

interface WeakPair {
	a: number;
	b: number;
	readers: Set<Reader>;
	/** the lowest value among the readers, those of grey print only when it is alone */
	found: number;
	borders: Set<number>;
}

/**
 * One plain sentence about the borders a reader could miss: the worst pair of inks by name, and how
 * many more pairs there are.
 *
 * In: the weak borders of a sheet with the list, colouring and inks they were found on.
 * Out: without a full stop, for instance "Ochre and Flint look alike to deutan readers along 7 borders".
 */
export function bordersSentence(
	weak: readonly WeakBorder[],
	borders: BorderList,
	colouring: ArrayLike<number>,
	inks: readonly Ink[],
): string {
	const pairs = new Map<string, WeakPair>();
	for (const { border, reader, found } of weak) {
		const pair = note(
			pairs,
			colouring[borders.a[border]],
			colouring[borders.b[border]],
			reader,
			found,
		);
		pair.borders.add(border);
	}
	return sentenceOf([...pairs.values()], inks);
}

/** The same for a palette on its own: one plain sentence about its worst failing pair. */
export function verdictSentence(verdict: PaletteVerdict, inks: readonly Ink[]): string {
	const failing = verdict.pairs.filter((pair) => !pair.passes);
	const label = verdict.labels.find((one) => !one.passes);
	if (failing.length === 0 && label) {
		const ratio = (Math.floor(label.contrast * 100) / 100).toFixed(2);
		return `The best label on ${inks[label.ink].name} reaches a contrast of only ${ratio}:1`;
	}
	const pairs = new Map<string, WeakPair>();
	for (const { a, b, reader, ciede2000, greyGap } of failing) {
		note(pairs, a, b, reader, reader === 'grey' ? greyGap : ciede2000);
	}
	return sentenceOf([...pairs.values()], inks);
}

function note(
	pairs: Map<string, WeakPair>,
	one: number,
	two: number,
	reader: Reader,
	found: number,
): WeakPair {
	const [a, b] = [Math.min(one, two), Math.max(one, two)];
	const key = `${a} ${b}`;
	const pair = pairs.get(key) ?? { a, b, readers: new Set(), found: Infinity, borders: new Set() };
	const byEye = [...pair.readers].some((other) => other !== 'grey');
	if (reader !== 'grey' && !byEye) pair.found = found;
	else if (reader !== 'grey' || !byEye) pair.found = Math.min(pair.found, found);
	pair.readers.add(reader);
	pairs.set(key, pair);
	return pair;
}

function sentenceOf(pairs: WeakPair[], inks: readonly Ink[]): string {
	if (pairs.length === 0) return 'Every reader can tell apart all inks that touch';
	const worst = pairs.reduce((one, two) => (badness(two) > badness(one) ? two : one));
	const verb = worst.found < alikeBelow ? 'look alike' : 'look rather alike';
	const along = worst.borders.size === 0 ? '' : ` along ${counted(worst.borders.size, 'border')}`;
	const names = `${inks[worst.a].name} and ${inks[worst.b].name}`;
	return `${names} ${verb} ${toWhom(worst.readers)}${along}${more(pairs.length - 1)}`;
}

/** An error before a warning, eyesight before grey print, then the lower value. */
function badness({ readers: missing, found }: WeakPair): number {
	const grey = onlyGrey(missing);
	return (grey ? 0 : 1000) + (!grey && found < alikeBelow ? 1000 : 0) - found;
}

function onlyGrey(missing: ReadonlySet<Reader>): boolean {
	return missing.size === 1 && missing.has('grey');
}

/** Who is meant, in words: `to protan and deutan readers and in grey print`. */
export function toWhom(missing: ReadonlySet<Reader>): string {
	const eyes = readers.filter((reader) => reader !== 'grey' && missing.has(reader));
	const print = missing.has('grey') ? ['in grey print'] : [];
	const people = eyes.length === 0 ? [] : [`to ${listed(eyes)} readers`];
	return [...people, ...print].join(' and ');
}

function listed(words: readonly string[]): string {
	if (words.length < 2) return words.join();
	return `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}

function more(pairs: number): string {
	if (pairs === 0) return '';
	return pairs === 1 ? '; 1 more pair is weak' : `; ${pairs} more pairs are weak`;
}

function counted(count: number, word: string): string {
	return `${count} ${word}${count === 1 ? '' : 's'}`;
}
