/** Texts are measured up to this length. */
export const longestMeasured = 200;

const rows = [new Uint16Array(longestMeasured + 1), new Uint16Array(longestMeasured + 1)];

/**
 * Letters to change, put in or leave out to make `b` of `a` (Levenshtein 1966, by the table of Wagner and
 * Fischer 1974), or `most + 1` where it takes more than `most`. Counts UTF-16 units of the first 200.
 */
export function editDistance(a: string, b: string, most: number): number {
	const [m, n] = [Math.min(a.length, longestMeasured), Math.min(b.length, longestMeasured)];
	if (Math.abs(m - n) > most) return most + 1;
	let [before, row] = rows;
	for (let j = 0; j <= n; j++) before[j] = j;
	for (let i = 1; i <= m; i++) {
		row[0] = i;
		let least = i;
		for (let j = 1; j <= n; j++) {
			const change = before[j - 1] + (a.charCodeAt(i - 1) === b.charCodeAt(j - 1) ? 0 : 1);
			row[j] = Math.min(change, before[j] + 1, row[j - 1] + 1);
			if (row[j] < least) least = row[j];
		}
		if (least > most) return most + 1;
		[before, row] = [row, before];
	}
	return Math.min(before[n], most + 1);
}
