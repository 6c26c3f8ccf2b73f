import { contrast, labelInk } from '../colour/contrast.ts';
import { ciede2000 } from '../colour/ciede2000.ts';
import { readers } from '../colour/reader.ts';
import { appearanceOf, found, type Appearance } from './appearance.ts';
import type { Thresholds } from './palette.ts';

/** What a mend must keep: the asked values, who touches whom, and where each ink stood. */
export interface MendTask {
	inks: readonly string[];
	/** touching inks of each ink */
	neighbours: readonly (readonly number[])[];
	asked: Thresholds;
	start: readonly Appearance[];
}

export function mendTask(
	inks: readonly string[],
	pairs: readonly (readonly [number, number])[],
	asked: Thresholds,
): MendTask {
	const neighbours = inks.map((_, ink) =>
		pairs.filter((pair) => pair.includes(ink)).map(([a, b]) => (a === ink ? b : a)),
	);
	return { inks, neighbours, asked, start: inks.map(appearanceOf) };
}

/** By how much two touching inks miss what is asked, summed over the readers; 0 when they pass. */
export function shortfall(asked: Thresholds, one: Appearance, two: Appearance): number {
	let sum = 0;
	for (const reader of readers) {
		const least = reader === 'grey' ? asked.grey : asked.ciede2000;
		sum += Math.max(0, least - found(reader, one, two));
	}
	return sum;
}

/** By how much the best label on an ink misses what is asked, in units of contrast; 0 when it passes. */
export function labelShortfall(asked: Thresholds, hex: string): number {
	return Math.max(0, asked.label - contrast(hex, labelInk(hex)));
}

/** How far an ink has moved from where it stood, in CIEDE2000 for a typical reader. */
export function moveOf(task: MendTask, ink: number, now: Appearance): number {
	return ciede2000(task.start[ink][0], now[0]);
}
