/**
 * A name set in one, two or three lines, each way as even as it can be; broken at spaces and after
 * hyphens only. In: the name and a measure of text width. Out: the ways in order of lines.
 */
export function linesOfName(name: string, width: (text: string) => number): string[][] {
	const words = name.match(/[^ \-–/]*(?:[-–/]| |$)/gu)!.filter((word) => word !== '');
	const ways: string[][] = [];
	for (let lines = 1; lines <= Math.min(3, words.length); lines++) {
		ways.push(mostEven(words, lines, width));
	}
	return ways;
}

function mostEven(words: string[], lines: number, width: (text: string) => number): string[] {
	let best: string[] = [];
	let bestWidth = Infinity;
	for (const at of breaks(words.length, lines)) {
		const ends = [...at, words.length];
		const way = ends.map((end, i) =>
			words
				.slice(i === 0 ? 0 : ends[i - 1], end)
				.join('')
				.trim(),
		);
		const widest = Math.max(...way.map(width));
		if (widest < bestWidth) [best, bestWidth] = [way, widest];
	}
	return best;
}

/** Names rarely have more than a dozen words: beyond that only the first breaks are tried. */
const mostBreaks = 15;

function breaks(words: number, lines: number): number[][] {
	if (lines === 1) return [[]];
	const last = Math.min(words - 1, mostBreaks);
	const places = Array.from({ length: last }, (_, i) => i + 1);
	if (lines === 2) return places.map((a) => [a]);
	return places.flatMap((a) => places.filter((b) => b > a).map((b) => [a, b]));
}
