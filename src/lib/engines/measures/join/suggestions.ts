import { editDistance, longestMeasured } from './edit-distance.ts';
import { fold } from './fold.ts';
import type { Regions, Suggestion } from './join.ts';

const mostSuggestions = 3;
/** A third of the letters may differ, at least one. */
const mostDistance = (text: string) => Math.max(1, Math.floor(text.length / 3));

/** Every pair of neighbouring letters, ends marked, repeats numbered. */
function pairs(text: string): string[] {
	const marked = `\u0002${text}\u0003`;
	const seen = new Map<string, number>();
	return Array.from({ length: marked.length - 1 }, (_, i) => {
		const pair = marked.slice(i, i + 2);
		const count = seen.get(pair) ?? 0;
		seen.set(pair, count + 1);
		return pair + count;
	});
}

/**
 * The regions nearest to a text by edit distance after folding: at most three, nearest first, then in the
 * order of regions; none further than a third of the letters. Only regions with enough pairs of letters in
 * common are measured: k changes spoil at most 2k of the pairs (Ukkonen 1992, q-grams), so that none within
 * reach is missed.
 */
export class Suggestions {
	private labels: string[];
	private byPair = new Map<string, number[]>();
	private shared: Uint16Array;
	/** work done so far: regions counted, and table cells of distances */
	steps = 0;

	constructor(regions: Regions, by: 'key' | 'name') {
		this.labels = (by === 'key' ? regions.keys : regions.names).map((label) =>
			fold(label).slice(0, longestMeasured),
		);
		this.shared = new Uint16Array(this.labels.length);
		this.labels.forEach((label, region) => {
			for (const pair of pairs(label)) {
				const there = this.byPair.get(pair);
				if (there) there.push(region);
				else this.byPair.set(pair, [region]);
			}
		});
	}

	for(text: string): Suggestion[] {
		// longer texts are no names; this bounds the work
		const folded = fold(text).slice(0, longestMeasured);
		if (!folded) return [];
		const most = mostDistance(folded);
		const found: Suggestion[] = [];
		for (const region of this.candidates(folded, most)) {
			this.steps += folded.length * this.labels[region].length;
			const distance = editDistance(folded, this.labels[region], most);
			if (distance <= most) found.push({ region, distance });
		}
		found.sort((a, b) => a.distance - b.distance || a.region - b.region);
		return found.slice(0, mostSuggestions);
	}

	private candidates(text: string, most: number): number[] {
		const own = pairs(text);
		const touched: number[] = [];
		for (const pair of own) {
			const holders = this.byPair.get(pair) ?? [];
			this.steps += holders.length;
			for (const region of holders) {
				if (this.shared[region]++ === 0) touched.push(region);
			}
		}
		const enough = touched.filter((region) => {
			const needed = Math.max(own.length, this.labels[region].length + 1) - 2 * most;
			return this.shared[region] >= needed;
		});
		for (const region of touched) this.shared[region] = 0;
		return enough;
	}
}

/** Suggestions for one text, as for the unmatched rows of a join; for texts beyond those it had steps for. */
export const suggestRegions = (text: string, regions: Regions, by: 'key' | 'name'): Suggestion[] =>
	new Suggestions(regions, by).for(text);
