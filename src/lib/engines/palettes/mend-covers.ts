/** How many partial sets are looked at before the listing ends. */
const mostTries = 20_000;

/**
 * The sets of `size` inks, all taken from `free`, that hold at least one ink of every failing pair and
 * every ink in `needed`: no smaller or other set can mend a palette. At most `most` are listed, in
 * ascending order of ink numbers, and the listing ends after a fixed number of tries: with many inks it
 * may miss sets.
 */
export function covers(
	free: readonly number[],
	size: number,
	failing: readonly (readonly [number, number])[],
	needed: readonly number[],
	most: number,
): number[][] {
	const found: number[][] = [];
	let tries = 0;
	const grow = (chosen: number[], next: number): void => {
		if (found.length >= most || tries++ > mostTries) return;
		const open = failing.find(([a, b]) => !chosen.includes(a) && !chosen.includes(b));
		if (chosen.length === size) {
			if (!open) found.push([...chosen].sort((a, b) => a - b));
			return;
		}
		const options = open ? open.filter((ink) => free.includes(ink)) : free.slice(next);
		for (const ink of options) {
			if (chosen.includes(ink)) continue;
			grow([...chosen, ink], open ? next : free.indexOf(ink) + 1);
		}
	};
	grow([...needed], 0);
	return distinct(found);
}

function distinct(sets: number[][]): number[][] {
	return [...new Map(sets.map((set) => [set.join(), set])).values()];
}
