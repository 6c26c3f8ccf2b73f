import { grow } from './growth.ts';
import { randomStream } from './random.ts';
import type { Roads } from './roads.ts';

const steps = 60_000;
/** What one border between two rounds counts against the squared deviations. */
const borderWeight = 0.002;

/**
 * A fair division: every district to one of the rounds, each round hangs together and carries about its
 * share of the load. Rounds grow from seeds far apart, then districts on their edges change hands while
 * that makes the division fairer or shorter in borders; now and then, less and less, although it does not.
 */
export function fairRounds(
	{ joined, middles }: Roads,
	load: readonly number[],
	shares: readonly number[],
	seed: number,
): Int32Array {
	const random = randomStream(seed);
	const far = (a: number, b: number) =>
		Math.hypot(middles[a][0] - middles[b][0], middles[a][1] - middles[b][1]);
	const owner = grow(joined, spread(joined.length, far, shares.length, random), far);
	const target = targets(load, shares);
	const carried = shares.map(() => 0);
	owner.forEach((round, district) => (carried[round] += load[district]));
	const off = (round: number, change: number) =>
		((carried[round] + change) / target[round] - 1) ** 2;
	for (let step = 0; step < steps; step++) {
		const heat = 0.02 * (1 - step / steps) ** 2;
		const district = Math.floor(random() * owner.length);
		const from = owner[district];
		const to = owner[joined[district][Math.floor(random() * joined[district].length)]];
		const chance = random();
		if (to === from || !hangsTogetherWithout(joined, owner, district)) continue;
		const weight = load[district];
		const cut = (round: number) => joined[district].filter((next) => owner[next] !== round).length;
		const gain = off(from, 0) + off(to, 0) - off(from, -weight) - off(to, weight);
		const worth = gain + borderWeight * (cut(from) - cut(to));
		if (worth < 0 && chance >= Math.exp(worth / (heat + 1e-9))) continue;
		carried[from] -= weight;
		carried[to] += weight;
		owner[district] = to;
	}
	return owner;
}

/** What each share carries of the whole. */
export function targets(load: readonly number[], shares: readonly number[]): number[] {
	const whole = load.reduce((sum, one) => sum + one, 0);
	const all = shares.reduce((sum, one) => sum + one, 0);
	return shares.map((share) => (share / all) * whole);
}

/** Whether a round, not emptied by it, still hangs together once this district is out of it. */
export function hangsTogetherWithout(
	joined: readonly (readonly number[])[],
	owner: ArrayLike<number>,
	district: number,
): boolean {
	const rest = [...joined.keys()].filter(
		(other) => other !== district && owner[other] === owner[district],
	);
	return rest.length > 0 && piecesOf(joined, rest).length === 1;
}

/** The pieces into which some districts fall, the largest first. */
export function piecesOf(
	joined: readonly (readonly number[])[],
	members: readonly number[],
): number[][] {
	const left = new Set(members);
	const pieces: number[][] = [];
	for (const first of members) {
		if (!left.delete(first)) continue;
		const piece = [first];
		for (const place of piece) {
			for (const next of joined[place]) if (left.delete(next)) piece.push(next);
		}
		pieces.push(piece);
	}
	return pieces.sort((a, b) => b.length - a.length);
}

function spread(
	count: number,
	far: (a: number, b: number) => number,
	wanted: number,
	random: () => number,
): number[] {
	const seeds = [Math.floor(random() * count)];
	const places = Array.from({ length: count }, (_, place) => place);
	const room = (place: number) => Math.min(...seeds.map((seed) => far(place, seed)));
	while (seeds.length < wanted) {
		seeds.push(places.reduce((best, place) => (room(place) > room(best) ? place : best)));
	}
	return seeds;
}
