import type { BorderList } from '../borders/border-list.ts';
import { borderKinds } from '../borders/border-list.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, found } from './appearance.ts';
import { alikeBelow, demandFor, greyWarnBelow } from './demand.ts';
import { hatchesTell } from './hatch-tells.ts';
import type { Hatch, WeakBorder } from './palette.ts';

export interface SheetFills {
	borders: BorderList;
	/** ink of each region, -1 for none */
	colouring: ArrayLike<number>;
	/** hex digits */
	inks: readonly string[];
	/** the hatch of each ink, where it has one; none when absent */
	hatches?: readonly (Hatch | undefined)[];
	/** printed size of each region in mm, as `regionSizesMm` of the sheet measures it */
	sizesMm: ArrayLike<number>;
	/** whether regions that meet in a point only must be told apart too; false when absent */
	pointTouches?: boolean;
	/** borders struck out by hand, by their number in the list */
	struck?: ReadonlySet<number>;
	/** the level above of each region: another line is drawn between two of them; one level when absent */
	groups?: readonly (string | null)[];
	/** whether the sheet itself says a region's name or the number of it; none when absent */
	labelled?: (region: number) => boolean;
}

const point = borderKinds.indexOf('point');

/** A border that asks for two inks, and has them. */
interface InkedBorder {
	border: number;
	regions: [number, number];
	inks: [number, number];
}

/** The borders of a sheet that count and lie between regions of two different inks, by number. */
export function* bordersThatCount(sheet: SheetFills): Generator<InkedBorder> {
	const { borders, colouring } = sheet;
	for (let border = 0; border < borders.a.length; border++) {
		const [one, two] = [borders.a[border], borders.b[border]];
		const [inkA, inkB] = [colouring[one], colouring[two]];
		if (inkA < 0 || inkB < 0 || inkA === inkB || !counts(sheet, border)) continue;
		yield { border, regions: [one, two], inks: [inkA, inkB] };
	}
}

/**
 * The borders of a sheet that some reader could miss.
 *
 * Out: one entry a border and reader, by border number, then in the order of `readers`. For the four
 * kinds of eyesight: found below what `demandFor` asks for the smaller region; an error below 5, else
 * a warning. For grey print: a warning below a gap of 5 in L*. A border whose sides a reader tells apart by
 * their hatches (`hatchesTell`) is not weak for that reader. Regions without an ink and pairs of one
 * and the same ink are left to the checker of the colouring.
 */
export function weakBorders(sheet: SheetFills): WeakBorder[] {
	const missed = differences(sheet.inks);
	const weak: WeakBorder[] = [];
	for (const { border, regions, inks } of bordersThatCount(sheet)) {
		const sizes: [number, number] = [sheet.sizesMm[regions[0]], sheet.sizesMm[regions[1]]];
		const asked = demandFor(Math.min(...sizes));
		readers.forEach((reader, place) => {
			const verdict = judge(reader, missed[inks[0]][inks[1]][place], asked);
			if (verdict && !hatched(sheet, inks, reader, sizes))
				weak.push({ border, reader, ...verdict });
		});
	}
	return weak;
}

function hatched(
	{ inks, hatches }: SheetFills,
	[a, b]: readonly [number, number],
	reader: Reader,
	sizes: readonly [number, number],
): boolean {
	if (!hatches?.[a] && !hatches?.[b]) return false;
	const fill = (ink: number) => ({ hex: inks[ink], hatch: hatches?.[ink] });
	return hatchesTell(fill(a), fill(b), reader, sizes);
}

function counts({ borders, pointTouches, struck }: SheetFills, border: number): boolean {
	return !struck?.has(border) && (pointTouches === true || borders.kind[border] !== point);
}

/** ink by ink by reader */
function differences(inks: readonly string[]): number[][][] {
	const seen = inks.map(appearanceOf);
	return seen.map((one) => seen.map((two) => readers.map((reader) => found(reader, one, two))));
}

function judge(
	reader: Reader,
	value: number,
	demand: number,
): Pick<WeakBorder, 'found' | 'asked' | 'severity'> | null {
	const asked = reader === 'grey' ? greyWarnBelow : demand;
	if (value >= asked) return null;
	const error = reader !== 'grey' && value < alikeBelow;
	return { found: value, asked, severity: error ? 'error' : 'warning' };
}
