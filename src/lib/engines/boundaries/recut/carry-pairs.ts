import { carriedRow, type CarriedRow, type Carrying } from './carried.ts';
import type { CarryGround } from './carry-ground.ts';

type Pair = readonly [number, number];

/** New pairs for a pair of old regions, or why there are none. */
export type Choose = (a: number[], b: number[], isPlain: boolean) => Pair[] | string;

/**
 * Rules about two regions each, on the new regions: for every old rule the pairs that `choose` finds
 * among the heirs of both, each pair once. `isPlain`: both regions go on one as one.
 */
export function carryPairs<T>(
	ground: CarryGround,
	rules: readonly T[],
	keysOf: (rule: T) => readonly [string, string],
	carryingOf: (rule: T) => Carrying,
	choose: Choose,
): { pairs: { rule: T; a: string; b: string }[]; rows: CarriedRow[] } {
	const seen = new Set<string>();
	const pairs: { rule: T; a: string; b: string }[] = [];
	const rows = rules.map((rule) => {
		const carrying = carryingOf(rule);
		const chosen = chosenFor(ground, keysOf(rule), choose);
		if (typeof chosen === 'string') return carriedRow(carrying, 'dropped', [], chosen);
		const fresh = chosen.filter(([a, b]) => {
			const code = a < b ? `${a} ${b}` : `${b} ${a}`;
			return seen.size < seen.add(code).size;
		});
		for (const [a, b] of fresh) pairs.push({ rule, a: ground.key(a), b: ground.key(b) });
		const now = [...new Set(chosen.flat())].map(ground.key);
		const outcome = fresh.length === 0 ? 'doubled' : chosen.length > 1 ? 'copied' : 'followed';
		return carriedRow(carrying, outcome, now);
	});
	return { pairs, rows };
}

function chosenFor(
	{ heirs, old }: CarryGround,
	keys: readonly [string, string],
	choose: Choose,
): Pair[] | string {
	const [a, b] = keys.map(old);
	const [now, then] = [heirs.now[a ?? -1] ?? [], heirs.now[b ?? -1] ?? []];
	if (a === undefined || b === undefined || now.length === 0 || then.length === 0) {
		return 'a region of it is gone';
	}
	return choose(now, then, heirs.isOne[a] && heirs.isOne[b]);
}

/** Every heir of one with every heir of the other; told when the two have become one. */
export function everyPair(a: number[], b: number[]): Pair[] | string {
	const pairs = a.flatMap((one) => b.map((other) => [one, other] as const));
	const apart = pairs.filter(([one, other]) => one !== other);
	return apart.length > 0 ? apart : 'the two regions have become one';
}
