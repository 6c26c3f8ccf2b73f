import { contrast } from '../colour/contrast.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, found } from './appearance.ts';
import { checkBorderLine } from './border-line.ts';
import { alikeBelow, greySafeFrom } from './demand.ts';
import { hatchesTell } from './hatch-tells.ts';
import type { PairDemand } from './pair-demands.ts';
import type { Ink } from './palette.ts';

/**
 * How a reader fares: `clear`; `near`: enough, though not yet safe in grey print; `hatch`: told apart by the
 * hatches alone; `weak`: below what is asked; `alike`: below 5, an error.
 */
export type PairState = 'clear' | 'near' | 'hatch' | 'weak' | 'alike';

export interface ReaderOnPair {
	reader: Reader;
	/** CIEDE2000, or for grey print the gap in L* */
	found: number;
	asked: number;
	state: PairState;
}

/** What tells two regions apart besides their fills (WCAG 2.2, 1.4.1: colour is never alone). */
export type BesideColour = 'hatch' | 'labels' | 'nothing';

export interface PairOnSheet extends PairDemand {
	readers: ReaderOnPair[];
	/** WCAG contrast of the two fills */
	contrast: number;
	/** of the border line against each fill, and whether both reach 3:1 */
	line: { contrast: [number, number]; passes: boolean };
	beside: BesideColour;
	mark: 'clear' | 'warning' | 'error';
}

export interface SheetLook {
	/** colour of the line between two regions */
	lineHex: string;
	/** whether regions carry their names, or numbers with a list */
	labels: boolean;
}

/**
 * The verdict on every pair of inks that touches on a sheet, at its printed size.
 *
 * In: the sheet's inks; its pairs as `pairDemands` finds them; the border line and whether there are labels.
 * Out: the pairs in the same order. Error: some reader sees less than 5 and no hatch helps. Warning: a reader
 * sees less than is asked and no hatch helps, the border line misses 3:1 against a fill, or a region under
 * 3.5 mm has neither a label nor a hatch to tell it by.
 */
export function pairsOnSheet(
	inks: readonly Ink[],
	demands: readonly PairDemand[],
	look: SheetLook,
): PairOnSheet[] {
	const seen = inks.map(({ hex }) => appearanceOf(hex));
	const lines = checkBorderLine(
		look.lineHex,
		inks.map(({ hex }) => hex),
	);
	return demands.map((demand) => {
		const { a, b, sizesMm } = demand;
		const told = (reader: Reader) => hatchesTell(inks[a], inks[b], reader, sizesMm);
		const judged = readers.map((reader): ReaderOnPair => {
			const asked = reader === 'grey' ? demand.grey : demand.ciede2000;
			const value = found(reader, seen[a], seen[b]);
			return {
				reader,
				found: value,
				asked,
				state: stateOf(reader, value, asked, () => told(reader)),
			};
		});
		const line = {
			contrast: [lines[a].contrast, lines[b].contrast] as [number, number],
			passes: lines[a].passes && lines[b].passes,
		};
		const beside = readers.every(told) ? 'hatch' : look.labels ? 'labels' : 'nothing';
		const rest = { readers: judged, line, beside: beside as BesideColour };
		return {
			...demand,
			...rest,
			contrast: contrast(inks[a].hex, inks[b].hex),
			mark: markOf(rest, demand.needsMore),
		};
	});
}

function stateOf(reader: Reader, value: number, asked: number, told: () => boolean): PairState {
	const grey = reader === 'grey';
	if (value >= asked) return grey && value < greySafeFrom ? 'near' : 'clear';
	if (told()) return 'hatch';
	return !grey && value < alikeBelow ? 'alike' : 'weak';
}

function markOf(
	{ readers: judged, line, beside }: Pick<PairOnSheet, 'readers' | 'line' | 'beside'>,
	needsMore: boolean,
): PairOnSheet['mark'] {
	if (judged.some(({ state }) => state === 'alike')) return 'error';
	const weak = judged.some(({ state }) => state === 'weak');
	return weak || !line.passes || (needsMore && beside === 'nothing') ? 'warning' : 'clear';
}

/** Whether a pair fails for some reader: what a mend, or another colouring, could put right. */
export const isUnsafe = ({ readers: judged }: Pick<PairOnSheet, 'readers'>): boolean =>
	judged.some(({ state }) => state === 'weak' || state === 'alike');
