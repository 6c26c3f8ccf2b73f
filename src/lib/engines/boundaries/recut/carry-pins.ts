import { carriedRow, type CarriedRow, type Carrying } from './carried.ts';
import { apartFrom, type CarryGround, type PairTest } from './carry-ground.ts';
import { listedKeys, quoted } from './words.ts';

/** What one region is pinned to. */
export interface Pin<T> {
	key: string;
	value: T;
}

/** How pins of a kind are told of, compared and kept from standing together. */
export interface PinRules<T> {
	said(pin: Pin<T>): Carrying;
	/** equal for pins that say the same */
	code(value: T): string | number;
	/** pairs of new regions that cannot both have a pin that says the same; null: none known */
	collide: PairTest | null;
	/** why a new region that was merged from several cannot have a pin, or null */
	against(fresh: number, value: T): string | null;
}

/** Pinned parts pin a region merged from several when they make up this share of it. Our choice. */
const enough = 0.5;

/**
 * Pins on the new regions. A piece of a split region has the pin too, unless it would collide with a
 * larger piece that has it already. Regions that become one keep their pin when the pinned ones agree
 * and make up half of what the new one goes on from; of equal pins the one with most ground stays.
 */
export function carryPins<T>(
	ground: CarryGround,
	pins: readonly Pin<T>[],
	rules: PinRules<T>,
): { pins: Pin<T>[]; rows: CarriedRow[] } {
	const claims = claimsOf(ground, pins);
	const against = new Map<number, string>();
	for (const [fresh, list] of claims) {
		const reason = reasonAgainst(ground, fresh, list, rules);
		if (reason) against.set(fresh, reason);
	}
	const pinned = new Map<string, T>();
	const rows = pins.flatMap((pin) => {
		const heirs = ground.heirsOf(pin.key);
		const fits = heirs.filter((fresh) => !against.has(fresh));
		const kept = apartFrom(fits, rules.collide);
		const isNew = kept.filter((fresh) => !pinned.has(ground.key(fresh)));
		for (const fresh of isNew) pinned.set(ground.key(fresh), claims.get(fresh)![0].value);
		return pinRows(ground, rules.said(pin), {
			heirs,
			fits,
			kept,
			isNew: isNew.length > 0,
			against,
		});
	});
	return { pins: Array.from(pinned, ([key, value]) => ({ key, value })), rows };
}

interface Found {
	heirs: number[];
	fits: number[];
	kept: number[];
	isNew: boolean;
	against: Map<number, string>;
}

function pinRows(
	ground: CarryGround,
	carrying: Carrying,
	{ heirs, fits, kept, isNew, against }: Found,
): CarriedRow[] {
	if (heirs.length === 0) return [carriedRow(carrying, 'dropped', [], 'the region is gone')];
	const rows: CarriedRow[] = [];
	if (kept.length > 0) {
		const outcome = !isNew ? 'doubled' : kept.length > 1 ? 'copied' : 'followed';
		rows.push(carriedRow(carrying, outcome, kept.map(ground.key)));
	}
	const reasons = new Set(heirs.flatMap((fresh) => against.get(fresh) ?? []));
	const colliding = fits.filter((fresh) => !kept.includes(fresh));
	if (colliding.length > 0) {
		const there = listedKeys(colliding.map((fresh) => quoted(ground.key(fresh))));
		reasons.add(`${there} would touch a larger piece with the same`);
	}
	for (const reason of reasons) rows.push(carriedRow(carrying, 'dropped', [], reason));
	return rows;
}

/** Pins of the old regions of each new one, that of the region with most ground first. */
function claimsOf<T>({ heirs, old }: CarryGround, pins: readonly Pin<T>[]): Map<number, Pin<T>[]> {
	const byOld = new Map<number, Pin<T>>();
	for (const pin of pins) {
		const region = old(pin.key);
		if (region !== undefined) byOld.set(region, pin);
	}
	const claims = new Map<number, Pin<T>[]>();
	heirs.was.forEach((olds, fresh) => {
		const list = olds.flatMap((region) => byOld.get(region) ?? []);
		if (list.length > 0) claims.set(fresh, list);
	});
	return claims;
}

function reasonAgainst<T>(
	{ heirs, key, old }: CarryGround,
	fresh: number,
	claims: Pin<T>[],
	rules: PinRules<T>,
): string | null {
	const olds = heirs.was[fresh];
	if (olds.length === 1) return null;
	if (new Set(claims.map(({ value }) => rules.code(value))).size > 1) {
		return `the parts of ${quoted(key(fresh))} say different things`;
	}
	const share = (regions: number[]) =>
		regions.reduce((sum, region) => sum + heirs.shareOfNew(region, fresh), 0);
	const pinned = share(claims.map((pin) => old(pin.key)!));
	if (pinned < enough * share(olds)) return `it held for less than half of ${quoted(key(fresh))}`;
	return rules.against(fresh, claims[0].value);
}
