import type { GoalWish } from '../colouring/goal-wish.ts';
import type { Theme } from '../measures/theme.ts';
import type { Ink } from '../palettes/palette.ts';
import { wholeLayout, type SheetLayout } from '../sheet/layout.ts';

/**
 * Everything about a sheet that people decide, kept whole at every save so that any earlier state can
 * be read again. Regions are named by their key. The colouring is computed from it, never typed in.
 */
export interface Draft {
	inks: number | 'fewest';
	palette: SheetPalette;
	/** region key -> pinned ink (number from 0), what dropping it costs, and who set it when */
	locks: Record<string, Lock>;
	forbidden: ForbiddenInk[];
	alike: [string, string][];
	apart: [string, string][];
	/** rules for many regions at once */
	groups: GroupRule[];
	/** inks (from 0) that no region gets unless it is locked to them */
	reserved: number[];
	/** what to aim for among the colourings that keep every rule, the most important first */
	goals: GoalWish[];
	/** adjoining sheets whose inks bind regions along this sheet's edge */
	ties: EdgeTie[];
	/** whether regions that meet in a point only must differ */
	pointTouches: boolean;
	/** a shared line shorter than this does not count, in metres; 0: every line does */
	leastMetres: number;
	/** pairs across water count up to this gap, in kilometres; 0: none; null: as the file was read */
	waterKm: number | null;
	/** borders struck out by hand, with the reason */
	struck: HandBorder[];
	/** borders added by hand, with the reason */
	added: HandBorder[];
	seed: number;
	layout: SheetLayout;
	/** the measure that the sheet shows in place of its colouring; null: the colouring */
	theme: Theme | null;
}

/** The inks a sheet is printed from: a copy, so that a palette changed later changes no sheet. */
export interface SheetPalette {
	/** id of the palette it was taken from, or `own` once it was changed here */
	id: string;
	name: string;
	inks: Ink[];
	/** of the sheet's own: id of the palette it was made from, where there is one */
	from?: string;
}

export interface Lock {
	ink: number;
	/** what dropping it costs: its weight */
	cost: number;
	by?: string;
	at?: string;
	/** number of the adjoining sheet that asks for it; absent when somebody set it */
	tie?: number;
}

export interface ForbiddenInk {
	key: string;
	ink: number;
	/** number of the adjoining sheet whose region across the edge has this ink */
	tie?: number;
}

/** All regions named alike, or every one different from every other; listed in full, not by column. */
export interface GroupRule {
	kind: 'alike' | 'different';
	/** "Province Nord": unique among the groups of a draft with the same kind */
	name: string;
	/** two or more; `different` at most `mostDifferent` */
	keys: string[];
}

/** More could not be told apart on paper, and each would need an ink of its own. */
export const mostDifferent = 64;

/** Pairs that the groups of a draft in which all differ may come to together. */
export const mostDifferentPairs = 500_000;

/** How many pairs the groups in which all differ come to. */
export const differentPairs = (groups: readonly Pick<GroupRule, 'kind' | 'keys'>[]): number =>
	groups.reduce(
		(sum, { kind, keys }) =>
			kind === 'different' ? sum + (keys.length * (keys.length - 1)) / 2 : sum,
		0,
	);

/**
 * That regions along the edge follow an adjoining sheet of the team as it was then. What follows from it
 * stands among the locks and forbidden inks, marked with the number of that sheet.
 */
export interface EdgeTie {
	/** number of the adjoining sheet */
	sheet: number;
	name: string;
	/** the edition whose inks are followed, or null for the draft's revision */
	edition: number | null;
	revision: number;
	by?: string;
	at?: string;
}

/** A pair of regions decided by hand: why, by whom and when. */
export interface HandBorder {
	a: string;
	b: string;
	reason: string;
	by?: string;
	at?: string;
}

/** What a document says that was written before these were asked. */
const unasked = (): Pick<Draft, Unasked> => ({
	leastMetres: 0,
	waterKm: null,
	groups: [],
	reserved: [],
	goals: [],
	ties: [],
	theme: null,
});
type Unasked = 'leastMetres' | 'waterKm' | 'groups' | 'reserved' | 'goals' | 'ties' | 'theme';

/** A stored document as a draft of today: what it does not say yet is as it was before it could be said. */
export const wholeDraft = ({ layout, ...document }: StoredDraft): Draft => ({
	...unasked(),
	...document,
	layout: wholeLayout(layout),
});

type StoredDraft = Omit<Draft, Unasked | 'layout'> &
	Partial<Pick<Draft, Unasked>> & { layout: Parameters<typeof wholeLayout>[0] };
