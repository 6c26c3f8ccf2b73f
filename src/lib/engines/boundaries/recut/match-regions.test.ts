import { describe, expect, it } from 'vitest';
import { bentCells, gridCells, landOf } from '../../../../../tests/support/recut-lands.ts';
import { acceptedFeatures, box, region } from '../../../../../tests/support/read-boundaries.ts';
import { matchRegions, type RegionMatch } from './index.ts';

/** "a,b > c: merged by area", with ? where it is doubted. */
const told = ({ groups, before, after }: RegionMatch) =>
	groups.map(({ before: olds, after: news, outcome, by, sure }) => {
		const [from, to] = [olds.map((r) => before.keys[r]), news.map((r) => after.keys[r])];
		return `${from} > ${to}: ${outcome} by ${by}${sure ? '' : '?'}`;
	});

const cells = bentCells(2, 4, [0.4, -0.9, 1, 0.1, -0.3, 0.8, -1]);
const land = (regions: Record<string, number[]>) => landOf(cells, regions);
const first = { a: [0], b: [1], c: [2, 3], d: [4], e: [5], f: [6, 7] };

describe('matching a later coverage', () => {
	it('finds regions that stay, also where others around them do not', async () => {
		const match = matchRegions(await land(first), await land({ ...first, g: [3], c: [2] }));
		expect(told(match)).toEqual([
			'a > a: kept by key',
			'b > b: kept by key',
			'c > c,g: split by area',
			'd > d: kept by key',
			'e > e: kept by key',
			'f > f: kept by key',
		]);
		expect(match.groups.map(({ outlineChanged }) => outlineChanged)).toEqual([
			...[false, false, true, false, false, false],
		]);
	});
	it('finds a region under another key, a merger, one that is gone and one that is new', async () => {
		const match = matchRegions(
			await land({ a: [0], b: [1], c: [2], d: [4] }),
			await land({ A: [0], bc: [1, 2], e: [7] }),
		);
		expect(told(match)).toEqual([
			'a > A: renamed by area',
			'b,c > bc: merged by area',
			'd > : gone by area',
			' > e: new by area',
		]);
	});
	it('doubts keys that have changed places', async () => {
		const match = matchRegions(await land(first), await land({ ...first, a: [1], b: [0] }));
		expect(told(match).slice(0, 2)).toEqual(['a > b: renamed by area?', 'b > a: renamed by area?']);
		expect(match.groups[0].words).toBe(
			'"a" is now called "b". The key "a" now stands for other ground. The key "b" stood for other ground.',
		);
	});
	it('does not take a key for a match where it lies elsewhere now', async () => {
		const match = matchRegions(await land({ a: [0], b: [1] }), await land({ a: [7], b: [1] }));
		expect(told(match)).toEqual([
			'a > : gone by area?',
			'b > b: kept by key',
			' > a: new by area?',
		]);
	});
	it('keeps a region by key where more than half of its ground is lost, and doubts it', async () => {
		const wide = gridCells(1, 10);
		const match = matchRegions(
			await landOf(wide, { a: [0, 1, 2, 3, 4, 5], b: [6, 7, 8, 9] }),
			await landOf(wide, { a: [0, 1], b: [2, 3, 4, 5, 6, 7, 8, 9] }),
		);
		expect(told(match)).toEqual(['a > a: kept by key?', 'b > b: kept by key?']);
		expect(match.groups[0].words).toContain('Only 33.3 % of the ground of "a" goes on here.');
		expect(match.links.shareOfOld).toEqual([1 / 3, 2 / 3, 1].map((v) => expect.closeTo(v, 9)));
	});
	it('calls a tangle a tangle', async () => {
		const grid = gridCells(2, 2);
		const match = matchRegions(
			await landOf(grid, { north: [2, 3], south: [0, 1] }),
			await landOf(grid, { west: [0, 2], east: [1, 3] }),
		);
		expect(told(match)).toEqual(['north,south > west,east: redrawn by area?']);
	});
	it('tells an enclave that was cut out of its surroundings', async () => {
		const grid = gridCells(3, 3);
		const ring = [0, 1, 2, 3, 5, 6, 7, 8];
		const match = matchRegions(
			await landOf(grid, { all: [...ring, 4] }),
			await landOf(grid, { all: ring, core: [4] }),
		);
		expect(told(match)).toEqual(['all > all,core: split by area']);
		expect(match.links.shareOfNew).toEqual([expect.closeTo(1, 9), expect.closeTo(1, 9)]);
	});
	it('follows an exclave to the region that took it', async () => {
		const wide = gridCells(1, 12);
		const [west, east] = [
			[0, 1, 2, 3, 4],
			[6, 7, 8, 9, 10],
		];
		const match = matchRegions(
			await landOf(wide, { a: [...west, 11], b: east }),
			await landOf(wide, { a: west, b: [...east, 11] }),
		);
		expect(told(match)).toEqual(['a > a: kept by key?', 'b > b: kept by key?']);
		expect(match.groups[0]).toMatchObject({ shareOfOld: expect.closeTo(5 / 6, 6), shareOfNew: 1 });
	});
	it('measures regions that overlap within their own file one by one', async () => {
		const before = await acceptedFeatures([box('a', 0, 0, 2, 1), box('b', 1, 0, 3, 1)]);
		const after = await acceptedFeatures([box('x', 0, 0, 2, 1.5), box('y', 1, 0, 3, 1.5)]);
		const { links } = matchRegions(before.coverage, after.coverage);
		expect(links.from).toEqual([0, 0, 1, 1]);
		expect(links.shareOfOld).toEqual([1, 0.5, 0.5, 1].map((v) => expect.closeTo(v, 9)));
	});
});

describe('longitudes', () => {
	const across = (id: string, shift: number) => box(id, 178 + shift, 10, 182 + shift, 14);
	it('are compared whole turns apart', async () => {
		const east = (await acceptedFeatures([across('a', 0), box('b', 160, 10, 178, 14)])).coverage;
		const west = { ...east, arcPoints: east.arcPoints.map((v, i) => (i % 2 ? v : v - 360)) };
		expect(told(matchRegions(east, west))).toEqual(['a > a: kept by key', 'b > b: kept by key']);
	});
	it('are compared where one file is cut at 180 degrees and the other is not', async () => {
		const whole = (await acceptedFeatures([across('a', 0), box('b', 160, 10, 178, 14)])).coverage;
		// something all round the world keeps the seam of the other file at 180 degrees
		const belt = Array.from({ length: 12 }, (_, i) =>
			box(`belt ${i}`, -180 + 30 * i, -5, -150 + 30 * i, 0),
		);
		const cut = (
			await acceptedFeatures([
				{
					...region('a'),
					geometry: {
						type: 'MultiPolygon',
						coordinates: [box('', 178, 10, 180, 14), box('', -180, 10, -178, 14)].map(
							({ geometry }) => geometry.coordinates,
						),
					},
				} as never,
				...belt,
			])
		).coverage;
		const match = matchRegions(whole, cut);
		expect(match.groups[0]).toMatchObject({
			outcome: 'kept',
			sure: true,
			shareOfOld: expect.closeTo(1, 9),
			shareOfNew: expect.closeTo(1, 9),
		});
	});
});
