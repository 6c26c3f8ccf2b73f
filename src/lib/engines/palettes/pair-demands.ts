import { demandFor, greyWarnBelow, needsLabelOrHatch } from './demand.ts';
import { bordersThatCount, type SheetFills } from './weak-borders.ts';

/** What two inks that touch on a sheet are asked for, by the smallest region on the borders between them. */
export interface PairDemand {
	/** ink numbers, a < b */
	a: number;
	b: number;
	/** least CIEDE2000 for every kind of eyesight */
	ciede2000: number;
	/** least gap in L* for grey print */
	grey: number;
	/** how many borders lie between regions of these inks */
	borders: number;
	/** the one with the smallest region on it, by its number in the list */
	tightest: number;
	/** the smallest printed size of a region of a, and of b, along these borders, mm */
	sizesMm: [number, number];
	/** so small that no fill is enough by itself: a border line, and a label or a hatch, must help */
	needsMore: boolean;
	/** how many of the regions that small, along these borders, carry neither a name nor a number */
	bare: number;
	/** what lines are drawn along these borders: between regions, between the levels above */
	ranks: LineRank[];
}

export type LineRank = 'region' | 'group';

/** The part of it that inks alone can meet: what a mend needs to know. */
export type AskedOfInks = Pick<PairDemand, 'a' | 'b' | 'ciede2000' | 'grey' | 'sizesMm'>;

/**
 * The pairs of inks that touch on a sheet and what each is asked for at the sheet's printed size.
 *
 * In: as for `weakBorders`. Out: by a then b; 10, 12 or 15 in CIEDE2000 by `demandFor` of the smallest
 * region on any border between the two, and a gap of 5 in L* for grey print. Pairs that only border regions
 * without an ink are no pairs.
 */
export function pairDemands(sheet: SheetFills): PairDemand[] {
	const pairs = new Map<number, Gathered>();
	for (const { border, regions, inks } of bordersThatCount(sheet)) {
		const [first, second] = inks[0] < inks[1] ? [0, 1] : [1, 0];
		const [a, b] = [inks[first], inks[second]];
		const sizes: [number, number] = [sheet.sizesMm[regions[first]], sheet.sizesMm[regions[second]]];
		const key = a * sheet.inks.length + b;
		const pair = pairs.get(key) ?? {
			a,
			b,
			borders: 0,
			tightest: border,
			sizesMm: sizes,
			...none(),
		};
		pairs.set(key, pair);
		widen(pair, border, sizes);
		pair.ranks.add(rankOf(sheet, regions));
		for (const region of regions) if (isBare(sheet, region)) pair.bare.add(region);
	}
	return [...pairs.values()]
		.sort((p, q) => p.a - q.a || p.b - q.b)
		.map(({ bare, ranks, ...pair }) => ({
			...{ ...pair, ...asked(pair.sizesMm) },
			...{ bare: bare.size, ranks: [...ranks].sort() },
		}));
}

interface Gathered extends Pick<PairDemand, 'a' | 'b' | 'borders' | 'tightest' | 'sizesMm'> {
	bare: Set<number>;
	ranks: Set<LineRank>;
}
const none = (): Pick<Gathered, 'bare' | 'ranks'> => ({ bare: new Set(), ranks: new Set() });

function widen(pair: Gathered, border: number, sizes: readonly [number, number]): void {
	pair.borders++;
	if (Math.min(...sizes) < Math.min(...pair.sizesMm)) pair.tightest = border;
	pair.sizesMm = [Math.min(pair.sizesMm[0], sizes[0]), Math.min(pair.sizesMm[1], sizes[1])];
}

const rankOf = ({ groups }: SheetFills, [one, two]: readonly [number, number]): LineRank =>
	groups && groups[one] !== groups[two] ? 'group' : 'region';

const isBare = ({ sizesMm, labelled }: SheetFills, region: number): boolean =>
	needsLabelOrHatch(sizesMm[region]) && !labelled?.(region);

function asked(
	sizes: readonly [number, number],
): Pick<PairDemand, 'ciede2000' | 'grey' | 'needsMore'> {
	const smallest = Math.min(...sizes);
	return {
		ciede2000: demandFor(smallest),
		grey: greyWarnBelow,
		needsMore: needsLabelOrHatch(smallest),
	};
}
