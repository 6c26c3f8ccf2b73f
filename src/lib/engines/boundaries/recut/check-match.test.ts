import { describe, expect, it } from 'vitest';
import { bentCells, landOf } from '../../../../../tests/support/recut-lands.ts';
import { checkMatch, matchRegions, type RegionMatch } from './index.ts';

const cells = bentCells(2, 4, [0.4, -0.9, 1, 0.1, -0.3, 0.8, -1]);
const before = await landOf(cells, { a: [0], b: [1, 2, 3], d: [4, 5], f: [6, 7] });
const after = await landOf(cells, { a: [0], b: [1, 2], d: [4], e: [5], x: [3, 6, 7] });

/** A match with something changed that the checker has to see. */
function faultsWith(change: (match: RegionMatch) => void): string[] {
	const match = structuredClone(matchRegions(before, after));
	change(match);
	return checkMatch(before, after, match);
}

describe('the checker of a match', () => {
	it('passes what the engine finds', () => {
		expect(faultsWith(() => {})).toEqual([]);
	});
	const cases: [string, string, (match: RegionMatch) => void][] = [
		['another land', 'The match is of other regions.', (m) => (m.before.keys[0] = 'z')],
		['an area that is not so', 'The match is of other regions.', (m) => (m.after.km2[0] *= 2)],
		['a group left out', 'A region before is in no group.', (m) => m.groups.pop()],
		['a region twice', 'is in two groups', (m) => m.groups[0].before.push(1)],
		['a column astray', 'leads past group', (m) => (m.groupOfNew[0] = 3)],
		['another outcome', 'is not renamed', (m) => (m.groups[0].outcome = 'renamed')],
		['no words', 'is not told in words', (m) => (m.groups[0].words = '')],
		['a share above 1', 'is not between 0 and 1', (m) => (m.links.shareOfOld[0] = 1.2)],
		['a share that does not fit', 'do not fit its area', (m) => (m.links.shareOfNew[0] = 0.2)],
		['a link cut', 'does not hang together', (m) => m.links.joins.fill(false)],
		['a link out of a group', 'leads out of a group', (m) => m.links.joins.fill(true)],
		['links out of order', 'out of order', (m) => m.links.from.reverse()],
	];
	it.each(cases)('sees %s', (_, words, change) => {
		expect(faultsWith(change).join(' ')).toContain(words);
	});
	it('sees shares that agree with each other but not with the land', () => {
		const faults = faultsWith(({ links }) => {
			for (const column of [links.km2, links.shareOfOld, links.shareOfNew]) {
				column.forEach((value, i) => (column[i] = i === 1 ? value * 0.95 : value));
			}
		});
		expect(faults).toEqual([expect.stringContaining('have other ground in common than it says')]);
	});
	it('sees ground in common that is not listed', () => {
		const faults = faultsWith(({ links }) => {
			const at = links.joins.indexOf(false);
			for (const column of Object.values(links)) column.splice(at, 1);
		});
		expect(faults).toEqual([expect.stringContaining('have other ground in common than it says')]);
	});
});
