import type { Ink } from '../palettes/palette.ts';
import type { Draft, EdgeTie, ForbiddenInk, Lock } from './draft.ts';

/** An adjoining sheet along the edge: which inks its regions there have. Regions of this sheet by key. */
export interface TieGround extends Omit<EdgeTie, 'by' | 'at'> {
	/** the palette of the adjoining sheet */
	inks: readonly Pick<Ink, 'hex' | 'name'>[];
	/** regions that are on both sheets, with their ink (from 0) there */
	same: readonly { key: string; ink: number }[];
	/** regions that touch one of the other sheet: its ink and name, metres of the line, 0 for a point */
	beside: readonly { key: string; ink: number; metres: number; other: string }[];
}

/** What a tie asks of a draft. */
export interface TieRules {
	locks: Record<string, Lock>;
	forbidden: ForbiddenInk[];
	/** inks of the other sheet along the edge that this palette does not have: they bind nothing */
	missing: number[];
	/** regions whose own lock goes against the tie; it stays */
	against: { key: string; ink: number; why: 'same' | 'beside' }[];
	/** keys of the regions that lie beside one of the other sheet by a border that counts */
	beside: string[];
}

/** Tied locks weigh as much as any other until somebody gives them another weight. */
const tiedCost = 1;

/**
 * What a tie asks of a draft: a region on both sheets has its ink there, one beside a region of the other
 * sheet has another ink than that. Inks are the same by number where the palettes are equal, else by
 * colour. Locks that somebody set, or another tie asks for, stay as they are.
 */
export function tieRules(ground: TieGround, draft: Draft): TieRules {
	const inkHere = inkMap(draft.palette.inks, ground.inks);
	const others = withoutTie(ground.sheet)(draft).locks;
	const rules: TieRules = { locks: {}, forbidden: [], missing: [], against: [], beside: [] };
	const missing = new Set<number>();
	for (const { key, ink } of ground.same) {
		const here = inkHere[ink] ?? null;
		const own = lockOf(others, key);
		if (here === null) missing.add(ink);
		else if (!own) rules.locks[key] = { ink: here, cost: tiedCost, tie: ground.sheet };
		else if (own.ink !== here) rules.against.push({ key, ink: here, why: 'same' });
	}
	const known = new Set<string>();
	const beside = new Set<string>();
	for (const { key, ink, metres } of ground.beside) {
		if (!counts(draft, metres)) continue;
		beside.add(key);
		const here = inkHere[ink] ?? null;
		if (here === null) missing.add(ink);
		if (here === null || known.size === known.add(`${here} ${key}`).size) continue;
		rules.forbidden.push({ key, ink: here, tie: ground.sheet });
		if (lockOf(others, key)?.ink === here) rules.against.push({ key, ink: here, why: 'beside' });
	}
	rules.missing = [...missing].sort((a, b) => a - b);
	rules.beside = [...beside];
	return rules;
}

const lockOf = (locks: Draft['locks'], key: string): Lock | undefined =>
	Object.hasOwn(locks, key) ? locks[key] : undefined;

/** As for borders within the sheet. */
const counts = ({ pointTouches, leastMetres }: Draft, metres: number): boolean =>
	metres === 0 ? pointTouches : metres >= leastMetres;

/** The number here of each ink of another palette; null where this one has no such colour. */
export function inkMap(
	own: readonly Pick<Ink, 'hex'>[],
	other: readonly Pick<Ink, 'hex'>[],
): (number | null)[] {
	const equal = own.length === other.length && own.every(({ hex }, ink) => hex === other[ink].hex);
	if (equal) return own.map((_, ink) => ink);
	return other.map(({ hex }) => {
		const found = own.findIndex((ink) => ink.hex === hex);
		return found < 0 ? null : found;
	});
}

/** A draft that follows an adjoining sheet as it is now, in place of whatever tie to it there was. */
export const withTie =
	(ground: TieGround) =>
	(draft: Draft): Draft => {
		const { locks, forbidden } = tieRules(ground, draft);
		const free = withoutTie(ground.sheet)(draft);
		const { sheet, name, edition, revision } = ground;
		return {
			...free,
			locks: { ...free.locks, ...locks },
			forbidden: [...free.forbidden, ...forbidden],
			ties: [...free.ties, { sheet, name, edition, revision }],
		};
	};

/** A draft without a tie and all that it asked for. */
export const withoutTie =
	(sheet: number) =>
	(draft: Draft): Draft => ({
		...draft,
		locks: Object.fromEntries(Object.entries(draft.locks).filter(([, { tie }]) => tie !== sheet)),
		forbidden: draft.forbidden.filter(({ tie }) => tie !== sheet),
		ties: draft.ties.filter((tie) => tie.sheet !== sheet),
	});
