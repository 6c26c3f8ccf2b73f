import type { BorderList } from '../borders/border-list.ts';
import { borderKinds } from '../borders/border-list.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, found } from './appearance.ts';
import { alikeBelow, demandFor, greyWarnBelow } from './demand.ts';
import type { WeakBorder } from './palette.ts';

export interface SheetFills {
	borders: BorderList;
	/** ink of each region, -1 for none */
	colouring: ArrayLike<number>;
	/** hex digits */
	inks: readonly string[];
	/** printed size of each region: the side of a square of its area on the sheet, in mm */
	sizesMm: ArrayLike<number>;
	/** whether regions that meet in a point only must be told apart too; false when absent */
	pointTouches?: boolean;
	/** borders struck out by hand, by their number in the list */
	struck?: ReadonlySet<number>;
}

const point = borderKinds.indexOf('point');

/**
 * The borders of a sheet that some reader could miss.
 *
 * Out: one entry a border and reader, by border number, then in the order of `readers`. For the four
 * kinds of eyesight: found below what `demandFor` asks for the smaller region; an error below 5, else
 * a warning. For grey print: a warning below a gap of 5 in L*. Regions without an ink and pairs of one
 * and the same ink are left to the checker of the colouring.
 */
export function weakBorders(sheet: SheetFills): WeakBorder[] {
	const missed = differences(sheet.inks);
	const weak: WeakBorder[] = [];
	for (let border = 0; border < sheet.borders.a.length; border++) {
		const [one, two] = [sheet.borders.a[border], sheet.borders.b[border]];
		const [inkA, inkB] = [sheet.colouring[one], sheet.colouring[two]];
		if (inkA < 0 || inkB < 0 || inkA === inkB || !counts(sheet, border)) continue;
		const asked = demandFor(Math.min(sheet.sizesMm[one], sheet.sizesMm[two]));
		readers.forEach((reader, place) => {
			const verdict = judge(reader, missed[inkA][inkB][place], asked);
			if (verdict) weak.push({ border, reader, ...verdict });
		});
	}
	return weak;
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
