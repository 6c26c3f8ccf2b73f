import { ciede2000 } from '../colour/ciede2000.ts';
import { contrast } from '../colour/contrast.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, found } from './appearance.ts';
import { checkBorderLine } from './border-line.ts';
import { alikeBelow, greySafeFrom } from './demand.ts';
import { hatchesTell } from './hatch-tells.ts';
import type { LineRank, PairDemand } from './pair-demands.ts';
import type { Ink } from './palette.ts';
import { secondOpinionOf } from './tritan-doubts.ts';

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

/**
 * What tells regions under 3.5 mm apart besides their fills (WCAG 2.2, 1.4.1: colour is never alone): their
 * hatches, to every reader; a name or a number for each of them; or, for some of them, nothing.
 */
export type BesideColour = 'hatch' | 'labels' | 'nothing';

export interface PairOnSheet extends PairDemand {
	readers: ReaderOnPair[];
	/** WCAG contrast of the two fills */
	contrast: number;
	/** of the faintest border line between them against each fill, and whether both reach 3:1 */
	line: { rank: LineRank; contrast: [number, number]; passes: boolean };
	/** null where no region is under 3.5 mm */
	beside: BesideColour | null;
	/**
	 * CIEDE2000 for tritan readers by the older model (Brettel et al. 1997), where it misses what is asked and
	 * that of the check does not: models of this deficiency differ most. A note, no verdict; else null
	 */
	tritanDoubt: number | null;
	mark: 'clear' | 'warning' | 'error';
}

/** Colours of the lines between two regions, and between two of the level above. */
export type SheetLines = Readonly<Record<LineRank, string>>;

/**
 * The verdict on every pair of inks that touches on a sheet, at its printed size.
 *
 * In: the sheet's inks; its pairs as `pairDemands` finds them; its border lines.
 * Out: the pairs in the same order. Error: some reader sees less than 5 and no hatch helps. Warning: a reader
 * sees less than is asked and no hatch helps, a border line misses 3:1 against a fill, or a region under
 * 3.5 mm has neither a label nor a hatch to tell it by.
 */
export function pairsOnSheet(
	inks: readonly Ink[],
	demands: readonly PairDemand[],
	lines: SheetLines,
): PairOnSheet[] {
	const seen = inks.map(({ hex }) => appearanceOf(hex));
	const hexes = inks.map(({ hex }) => hex);
	const second = hexes.map(secondOpinionOf);
	const onInks = {
		region: checkBorderLine(lines.region, hexes),
		group: checkBorderLine(lines.group, hexes),
	};
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
		const line = faintest(
			demand.ranks.map((rank) => ({
				rank,
				contrast: [onInks[rank][a].contrast, onInks[rank][b].contrast],
				passes: onInks[rank][a].passes && onInks[rank][b].passes,
			})),
		);
		const rest = { readers: judged, line, beside: besideOf(demand, () => readers.every(told)) };
		return {
			...demand,
			...rest,
			contrast: contrast(inks[a].hex, inks[b].hex),
			mark: markOf(rest),
			tritanDoubt: doubtOf(judged, ciede2000(second[a], second[b]), () => told('tritan')),
		};
	});
}

function doubtOf(judged: readonly ReaderOnPair[], second: number, told: () => boolean) {
	const first = judged.find(({ reader }) => reader === 'tritan');
	if (!first || first.found < first.asked || second >= first.asked) return null;
	return told() ? null : second;
}

function faintest(lines: PairOnSheet['line'][]): PairOnSheet['line'] {
	const least = ({ contrast: found }: PairOnSheet['line']) => Math.min(...found);
	return lines.reduce((one, two) => (least(two) < least(one) ? two : one));
}

function besideOf({ needsMore, bare }: PairDemand, hatched: () => boolean): BesideColour | null {
	if (!needsMore) return null;
	if (hatched()) return 'hatch';
	return bare === 0 ? 'labels' : 'nothing';
}

function stateOf(reader: Reader, value: number, asked: number, told: () => boolean): PairState {
	const grey = reader === 'grey';
	if (value >= asked) return grey && value < greySafeFrom ? 'near' : 'clear';
	if (told()) return 'hatch';
	return !grey && value < alikeBelow ? 'alike' : 'weak';
}

function markOf({
	readers: judged,
	line,
	beside,
}: Pick<PairOnSheet, 'readers' | 'line' | 'beside'>): PairOnSheet['mark'] {
	if (judged.some(({ state }) => state === 'alike')) return 'error';
	const weak = judged.some(({ state }) => state === 'weak');
	return weak || !line.passes || beside === 'nothing' ? 'warning' : 'clear';
}

/** Whether a pair fails for some reader: what a mend, or another colouring, could put right. */
export const isUnsafe = ({ readers: judged }: Pick<PairOnSheet, 'readers'>): boolean =>
	judged.some(({ state }) => state === 'weak' || state === 'alike');
