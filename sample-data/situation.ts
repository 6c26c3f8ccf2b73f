import type { Roads } from './roads.ts';
import { hangsTogetherWithout, targets } from './rounds.ts';

/** Where things stand today, made out of a fair division by undoing some of it. */
export interface Situation {
	/** round of every district today; the leaver's is numbered after those of the division */
	today: Int32Array;
	/** the round that is new and has its base alone today */
	newcomer: number;
	base: number;
	/** carries too much: it looks after part of what is to be the new round */
	over: number;
	/** carries too little: the leaver has part of it */
	under: number;
	/** has a district that nothing joins to the rest of it */
	torn: number;
	strayed: number;
}

interface Ground {
	roads: Roads;
	load: readonly number[];
	target: number[];
	fair: Int32Array;
}

/** Out of a tolerance of 10 % by a little: least and greatest deviation of the two that are. */
const [outBy, outAtMost] = [0.2, 0.28];
/** The others stay this far inside it. */
const calmWithin = 0.085;

/**
 * Undoes a fair division the way firms grow apart. The leaver has what is to become the new round, but for
 * its base; a neighbour looks after part of it, and the leaver after part of another neighbour's; and one
 * round has a district beyond its own borders. The first such situation in order of rounds is taken; the
 * division itself stays a plan that mends it.
 */
export function situationFrom(
	roads: Roads,
	load: readonly number[],
	shares: readonly number[],
	fair: Int32Array,
): Situation {
	const ground = { roads, load, target: targets(load, shares), fair };
	for (const newcomer of shares.keys()) {
		if (shares[newcomer] !== 1) continue;
		const around = [...shares.keys()].filter(
			(r) => shares[r] === 1 && touches(ground, newcomer, r),
		);
		for (const over of around) {
			for (const under of around) {
				const found = over !== under && undone(ground, newcomer, over, under, shares.length);
				if (found) return found;
			}
		}
	}
	throw new Error('No situation of this kind with this seed');
}

function undone(
	ground: Ground,
	newcomer: number,
	over: number,
	under: number,
	leaver: number,
): Situation | null {
	const { roads, fair, target } = ground;
	const today = fair.map((round) => (round === newcomer ? leaver : round));
	if (!passOn(ground, today, { from: leaver, to: over, until: over })) return null;
	if (!passOn(ground, today, { from: under, to: leaver, until: under })) return null;
	const within = (district: number) =>
		roads.joined[district].filter((next) => fair[next] === newcomer).length;
	const home = membersOf(today, leaver).filter((district) => fair[district] === newcomer);
	const base = home.reduce((best, district) => (within(district) > within(best) ? district : best));
	today[base] = newcomer;
	const calm = [...target.keys()].filter((round) => ![newcomer, over, under].includes(round));
	for (const torn of calm) {
		const strayed = strayDistrict(ground, today, torn, calm);
		if (strayed === undefined) continue;
		today[strayed] = torn;
		return { today, newcomer, base, over, under, torn, strayed };
	}
	return null;
}

/** Passes districts on, one by one, until the round in question is out of tolerance. */
function passOn(
	ground: Ground,
	today: Int32Array,
	{ from, to, until }: { from: number; to: number; until: number },
): boolean {
	const { roads, load, target } = ground;
	while (Math.abs(deviation(ground, today, until)) < outBy) {
		const next = membersOf(today, from).find(
			(district) =>
				load[district] < 0.1 * target[until] &&
				roads.joined[district].some((other) => today[other] === to) &&
				(from !== until || hangsTogetherWithout(roads.joined, today, district)),
		);
		if (next === undefined) return false;
		today[next] = to;
	}
	return Math.abs(deviation(ground, today, until)) <= outAtMost;
}

/** A district of another calm round, nowhere beside this one, that both can do with or without. */
function strayDistrict(
	ground: Ground,
	today: Int32Array,
	torn: number,
	calm: readonly number[],
): number | undefined {
	const { roads } = ground;
	return [...today.keys()].find((district) => {
		const round = today[district];
		if (round === torn || !calm.includes(round)) return false;
		const near = new Set(roads.joined[district].flatMap((next) => [next, ...roads.joined[next]]));
		const beside = roads.joined[district].some((next) => today[next] === torn);
		if (beside || ![...near].some((next) => today[next] === torn)) return false;
		if (!hangsTogetherWithout(roads.joined, today, district)) return false;
		const then = today.with(district, torn);
		return calm.every((one) => Math.abs(deviation(ground, then, one)) <= calmWithin);
	});
}

function deviation({ load, target }: Ground, owner: Int32Array, round: number): number {
	const carried = membersOf(owner, round).reduce((sum, district) => sum + load[district], 0);
	return carried / target[round] - 1;
}

const membersOf = (owner: Int32Array, round: number): number[] =>
	[...owner.keys()].filter((district) => owner[district] === round);

const touches = ({ roads, fair }: Ground, a: number, b: number): boolean =>
	a !== b &&
	membersOf(fair, a).some((district) => roads.joined[district].some((n) => fair[n] === b));
