import type { Prepared } from './prepare.ts';

/** Up to so many guests every choice of them is tried; beyond, a test that never errs on impossible. */
const mostGuests = 12;

export interface Sharing {
	prepared: Prepared;
	/** load of the part in each bound measure */
	load: number[];
	settled: number[];
	guests: number[];
	/** territories that can live there at most: its units */
	most: number;
}

export interface Shares {
	possible: boolean;
	/** for each bound measure the tolerance that alone would make it possible, Infinity for none known */
	eased: number[];
}

/**
 * Whether some choice of guests beside the settled ones can hold the load between the sum of their least
 * and the sum of their greatest, in every measure at once. Exact up to `mostGuests` guests; beyond, each
 * number of guests is tested with the smallest and the largest of them, so `possible: false` stays true
 * and the eased tolerances are those of choices that exist, perhaps not the smallest.
 */
export function shareOut(sharing: Sharing): Shares {
	const { settled, guests, most } = sharing;
	const eased = sharing.load.map(() => Infinity);
	if (guests.length <= mostGuests) {
		for (let choice = 0; choice < 1 << guests.length; choice++) {
			const chosen = guests.filter((_, i) => choice & (1 << i));
			const count = settled.length + chosen.length;
			if (count === 0 || count > most) continue;
			if (holds(sharing, [...settled, ...chosen], eased)) return { possible: true, eased };
		}
		return { possible: false, eased };
	}
	const { capacity } = capacities(sharing);
	const rising = [...guests].sort((a, b) => capacity(a) - capacity(b));
	for (let n = 0; n <= guests.length; n++) {
		const count = settled.length + n;
		if (count === 0 || count > most) continue;
		const small = [...settled, ...rising.slice(0, n)];
		const large = [...settled, ...rising.slice(guests.length - n)];
		if (between(sharing, small, large)) return { possible: true, eased };
		holds(sharing, small, eased);
		holds(sharing, large, eased);
	}
	return { possible: false, eased };
}

const capacities = ({ prepared }: Sharing) => ({
	capacity: (t: number) => prepared.problem.territories[t].capacity,
});

function holds(sharing: Sharing, chosen: number[], eased: number[]): boolean {
	const { prepared, load } = sharing;
	const outside = load.flatMap((value, row) =>
		value < sum(prepared, prepared.least, row, chosen) ||
		value > sum(prepared, prepared.greatest, row, chosen)
			? [row]
			: [],
	);
	if (outside.length === 1) {
		const [row] = outside;
		const target = sum(prepared, prepared.targets, row, chosen);
		eased[row] = Math.min(eased[row], Math.abs(load[row] - target) / target);
	}
	return outside.length === 0;
}

function between({ prepared, load }: Sharing, small: number[], large: number[]): boolean {
	return load.every(
		(value, row) =>
			value >= sum(prepared, prepared.least, row, small) &&
			value <= sum(prepared, prepared.greatest, row, large),
	);
}

/** Sum over territories; the part in a thousand million guards against the last bits of long sums. */
function sum(prepared: Prepared, of: Float64Array, row: number, chosen: number[]): number {
	const total = chosen.reduce((all, t) => all + of[row * prepared.territories + t], 0);
	if (of === prepared.least) return total - Math.abs(total) * 1e-12;
	return of === prepared.greatest ? total + Math.abs(total) * 1e-12 : total;
}
