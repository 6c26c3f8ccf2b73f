/**
 * Letters to change, put in or leave out to make `b` of `a` (Levenshtein 1966, by the table of Wagner and
 * Fischer 1974), or `most + 1` where it takes more than `most`. Counts UTF-16 units.
 */
export function editDistance(a: string, b: string, most: number): number {
	if (Math.abs(a.length - b.length) > most) return most + 1;
	let before = Array.from({ length: b.length + 1 }, (_, j) => j);
	for (let i = 1; i <= a.length; i++) {
		const row = [i];
		let least = i;
		for (let j = 1; j <= b.length; j++) {
			const change = before[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1);
			row[j] = Math.min(change, before[j] + 1, row[j - 1] + 1);
			least = Math.min(least, row[j]);
		}
		if (least > most) return most + 1;
		before = row;
	}
	return Math.min(before[b.length], most + 1);
}
