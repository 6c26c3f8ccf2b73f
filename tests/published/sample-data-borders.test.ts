import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { borderKinds } from '../../src/lib/engines/borders/index.ts';
import { readBoundaries, sourceOf } from '../../src/lib/engines/boundaries/index.ts';
import { checkColouring, colour } from '../../src/lib/engines/colouring/index.ts';
import { buildGraph, planarity } from '../../src/lib/engines/graph/index.ts';

async function read(name: string) {
	const bytes = readFileSync(new URL(`../../sample-data/${name}`, import.meta.url));
	const result = await readBoundaries(sourceOf(name, bytes));
	return result.status === 'accepted' ? result : expect.fail(`${name}: ${JSON.stringify(result)}`);
}

const count = (kinds: Uint8Array, kind: (typeof borderKinds)[number]) =>
	kinds.filter((code) => borderKinds[code] === kind).length;

// the counts that topojson-server finds in sample-data.test.ts
it.each(['tavaroe.geojson', 'tavaroe-survey-grid.zip'])(
	'%s gives 180 regions, 445 borders by line, 2 by point and the enclave city',
	async (name) => {
		const { coverage, borders } = await read(name);
		expect(coverage.keys).toHaveLength(180);
		expect(coverage.regionParts[180]).toBe(183);
		expect(coverage.keys[0]).toBe('0101');
		expect([count(borders.kind, 'line'), count(borders.kind, 'point')]).toEqual([445, 2]);
		const enclaves = coverage.names.filter((_, region) => coverage.enclaveOf[region] >= 0);
		expect(enclaves).toEqual(['Tavarhavn']);
	},
);

it('reads the same names, lengths and areas from both files', async () => {
	const [one, two] = [await read('tavaroe.geojson'), await read('tavaroe-survey-grid.zip')];
	expect(two.coverage.names).toEqual(one.coverage.names);
	expect(two.coverage.names.some((name) => /[œš]/.test(name))).toBe(true);
	one.borders.metres.forEach((metres, i) =>
		expect(Math.abs(two.borders.metres[i] - metres)).toBeLessThan(0.01),
	);
	one.coverage.areasKm2.forEach((area, i) =>
		expect(two.coverage.areasKm2[i] / area).toBeCloseTo(1, 7),
	);
});

it('needs four inks, and its exclave keeps the borders from being planar', async () => {
	const { borders } = await read('tavaroe.geojson');
	const problem = { regions: 180, borders, inks: 'fewest' as const };
	const result = await colour(problem);
	if (result.status !== 'coloured') return expect.fail(result.status);
	expect([result.inksUsed, result.lowerBound]).toEqual([4, 4]);
	expect(checkColouring(problem, result)).toEqual([]);
	const lines = [...borders.kind.keys()].filter((i) => borderKinds[borders.kind[i]] === 'line');
	const graph = buildGraph(
		180,
		lines.map((i) => borders.a[i]),
		lines.map((i) => borders.b[i]),
	);
	expect(planarity(graph).planar).toBe(false);
});

it("finds all 445 borders through the noise of the second supplier's file", async () => {
	const [clean, dirty] = [
		await read('tavaroe.geojson'),
		await read('tavaroe-second-supplier.geojson'),
	];
	expect(dirty.coverage.keys).toHaveLength(181);
	const pairs = ({ coverage, borders }: typeof clean) =>
		new Set(
			[...borders.kind.keys()]
				.filter((i) => borderKinds[borders.kind[i]] === 'line')
				.map((i) => [coverage.keys[borders.a[i]], coverage.keys[borders.b[i]]].sort().join(' ')),
		);
	// the district that is there twice, as 0308 and 0308B, may be met under either code
	const found = new Set([...pairs(dirty)].map((pair) => pair.replace('0308B', '0308')));
	expect([...pairs(clean)].filter((pair) => !found.has(pair))).toEqual([]);
});

it("tells of every overlap in the second supplier's file and of no other", async () => {
	const { findings } = await read('tavaroe-second-supplier.geojson');
	const overlaps = findings.filter(({ code }) => code === 'overlap');
	// as sample-data/README.md lists them: three made 40 m wide, and a crumb
	expect(overlaps.map(({ regions }) => [...regions].sort().join(' ')).sort()).toEqual([
		'0108 0910',
		'0109 0708',
		'0110 0111',
		'0303 0306',
	]);
});

it("tells of every other slip in the second supplier's file, and of none in the clean one", async () => {
	const { findings } = await read('tavaroe-second-supplier.geojson');
	// how many of each: sample-data/README.md; what is one finding a kind names its districts
	const count = (wanted: string) => findings.filter(({ code }) => code === wanted).length;
	expect([count('sliver'), count('gap'), count('duplicate-region')]).toEqual([4, 1, 1]);
	const regions = (wanted: string) => findings.find(({ code }) => code === wanted)?.regions;
	expect(regions('duplicate-region')?.toSorted()).toEqual(['0308', '0308B']);
	for (const one of ['spike-dropped', 'corner-doubled', 'ring-turned', 'ring-closed'])
		expect(regions(one), one).toHaveLength(1);
	expect(regions('vertices-joined')?.length).toBeGreaterThanOrEqual(12);
	const unplaced = findings.filter(({ at }) => at === null).map(({ code }) => code);
	expect(unplaced.toSorted()).toEqual(['ring-closed', 'ring-turned']);
	expect((await read('tavaroe.geojson')).findings).toEqual([]);
});
