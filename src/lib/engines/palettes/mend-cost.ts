import { contrast, labelInk } from '../colour/contrast.ts';
import { ciede2000 } from '../colour/ciede2000.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, found, type Appearance } from './appearance.ts';
import type { Thresholds } from './palette.ts';

/** What is asked of two inks that touch. */
export interface PairAsk {
	a: number;
	b: number;
	/** least CIEDE2000 for every reader but grey print */
	ciede2000: number;
	/** least gap in L* for grey print */
	grey: number;
	/** readers who tell the two apart by their hatches; none when absent */
	told?: readonly Reader[];
}

/** What a mend must keep: the asked values, who touches whom, and where each ink stood. */
export interface MendTask {
	inks: readonly string[];
	/** how each ink is called in reasons */
	names: readonly string[];
	pairs: readonly PairAsk[];
	/** touching inks of each ink */
	neighbours: readonly (readonly number[])[];
	/** what is asked of two touching inks, ink by ink */
	asks: readonly (readonly PairAsk[])[];
	/** least contrast of a label */
	label: number;
	start: readonly Appearance[];
}

export function mendTask(
	inks: readonly string[],
	names: readonly string[],
	pairs: readonly PairAsk[],
	label: number,
): MendTask {
	const neighbours: number[][] = inks.map(() => []);
	const asks: PairAsk[][] = inks.map(() => []);
	for (const pair of pairs) {
		neighbours[pair.a].push(pair.b);
		neighbours[pair.b].push(pair.a);
		asks[pair.a][pair.b] = asks[pair.b][pair.a] = pair;
	}
	return { inks, names, pairs, neighbours, asks, label, start: inks.map(appearanceOf) };
}

/** One and the same demand of every pair, as the thresholds of `checkPalette` make it. */
export const flatAsks = (
	pairs: readonly (readonly [number, number])[],
	{ ciede2000: least, grey }: Pick<Thresholds, 'ciede2000' | 'grey'>,
): PairAsk[] => pairs.map(([a, b]) => ({ a, b, ciede2000: least, grey }));

/** What a pair asks for one reader; null where hatches tell it apart for this reader. */
export function askedFor(ask: PairAsk, reader: Reader): number | null {
	if (ask.told?.includes(reader)) return null;
	return reader === 'grey' ? ask.grey : ask.ciede2000;
}

/** By how much two touching inks miss what is asked, summed over the readers; 0 when they pass. */
export function shortfall(ask: PairAsk, one: Appearance, two: Appearance): number {
	let sum = 0;
	for (const reader of readers) {
		const least = askedFor(ask, reader);
		if (least !== null) sum += Math.max(0, least - found(reader, one, two));
	}
	return sum;
}

/** By how much the best label on an ink misses what is asked, in units of contrast; 0 when it passes. */
export function labelShortfall(asked: number, hex: string): number {
	return Math.max(0, asked - contrast(hex, labelInk(hex)));
}

/** How far an ink has moved from where it stood, in CIEDE2000 for a typical reader. */
export function moveOf(task: MendTask, ink: number, now: Appearance): number {
	return ciede2000(task.start[ink][0], now[0]);
}
