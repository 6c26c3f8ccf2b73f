import { booleanPointInPolygon } from '@turf/turf';
import { describe, expect, it } from 'vitest';
import { dirtyMaps } from '../../../../../tests/support/dirty-maps.ts';
import { allValid, partsOf, unionAndSum } from '../../../../../tests/support/geos-areas.ts';
import {
	acceptedFeatures,
	box,
	pairsOf,
	region,
} from '../../../../../tests/support/read-boundaries.ts';
import { coverageFaults, coverageToGeoJson, type Finding, type Mend } from '../index.ts';

const about = (findings: Finding[], code: string) => findings.filter((one) => one.code === code);
const places = (findings: Finding[], code: string) =>
	about(findings, code).map(({ regions, at }) => `${regions.toSorted()} ${at}`);

/** What is left of a map when a step is applied, held to the rules of a coverage and to GEOS. */
async function mended(map: Parameters<typeof acceptedFeatures>[0], mends: Mend[]) {
	const read = await acceptedFeatures(map, { mends });
	expect(coverageFaults(read.coverage)).toEqual([]);
	expect(about(read.findings, 'mend-not-applied')).toEqual([]);
	return { read, features: coverageToGeoJson(read.coverage).features };
}

const faults = [
	...['sliver', 'gap', 'overlap', 'duplicate-region'],
	...['self-crossing', 'parts-overlap', 'stray-part'],
];

describe.each(Object.entries(dirtyMaps))('%s', (_, { code, map }) => {
	it('is found, with one usual mend', async () => {
		const { findings } = await acceptedFeatures(map);
		const [finding, ...others] = about(findings, code);
		expect(others).toEqual([]);
		expect(finding.at).not.toBeNull();
		expect(finding.offers?.filter(({ usual }) => usual)).toHaveLength(1);
		expect(findings.filter((one) => faults.includes(one.code))).toHaveLength(1);
		for (const { words } of finding.offers ?? []) expect(words).toMatch(/\d.* (k?m²).*\.$/);
	});

	it('has its place inside the fault', async () => {
		const [{ at }] = about((await acceptedFeatures(map)).findings, code);
		// looked up by turf's point in polygon, part by part
		const covered = map
			.flatMap(({ geometry }) => partsOf(geometry))
			.filter((part) => booleanPointInPolygon(at as [number, number], part));
		const times: Record<string, number> = { sliver: 0, gap: 0, 'stray-part': 1 };
		if (code === 'self-crossing') expect(covered.length).toBeGreaterThan(0);
		else expect(covered).toHaveLength(times[code] ?? 2);
	});

	it('is gone after any mend that is offered, and nothing else is there instead', async () => {
		const before = await acceptedFeatures(map);
		const was = await unionAndSum(map);
		for (const { mend, words } of about(before.findings, code)[0].offers ?? []) {
			const { read, features } = await mended(map, [mend]);
			expect(
				read.findings.filter((one) => faults.includes(one.code)),
				words,
			).toEqual([]);
			const [note, ...more] = about(read.findings, 'mended');
			expect(more).toEqual([]);
			expect(note.severity).toBe('note');
			expect(note.at).not.toBeNull();
			// GEOS: no land is covered twice any more, and none was lost unless it was left out.
			expect(await allValid(features)).toBe(true);
			const is = await unionAndSum(features);
			expect(is.sum).toBeCloseTo(is.union, 9);
			if (mend.kind === 'settle') expect(is.union).toBeCloseTo(was.union, 9);
			if (mend.kind === 'fill') expect(is.union).toBeGreaterThan(was.union);
			if (mend.kind === 'untangle') expect(is.union).toBeCloseTo(was.union, 9);
		}
	});
});

describe('steps in a row', () => {
	const four = dirtyMaps['two that overlap in part'].map;
	it('that do not apply are told and change nothing', async () => {
		const mends: Mend[] = [
			{ kind: 'fill', at: [0.5, 0.5], into: 'w' },
			{ kind: 'fill', at: [0.5, 0.5], into: 'nobody' },
			{ kind: 'settle', a: 'w', b: 'n', keep: 'w' },
			{ kind: 'settle', a: 'w', b: 'e', keep: 'n' },
			{ kind: 'drop', key: 'nobody' },
			{ kind: 'merge', key: 'w', into: 'w' },
			{ kind: 'untangle', key: 'w' },
			{ kind: 'part', key: 'w', at: [0.5, 0.5], into: null },
			{ kind: 'part', key: 'w', at: [7, 7], into: 'e' },
		];
		const plain = await acceptedFeatures(four);
		const read = await acceptedFeatures(four, { mends });
		expect(about(read.findings, 'mend-not-applied')).toHaveLength(mends.length);
		expect(read.coverage).toEqual(plain.coverage);
		expect(read.borders).toEqual(plain.borders);
		const told = about(read.findings, 'mend-not-applied').map(({ message }) => message);
		expect(told[0]).toMatch(/longitude 0\.50000.* to w was not done: the place is not a hole/);
		expect(told[4]).toBe('Leaving out nobody was not done: there is no region nobody any more.');
	});
	it('build on each other: a hole that is there only once a region is left out', async () => {
		const nine = [0, 1, 2].flatMap((x) =>
			[0, 1, 2].map((y) => box(`${x}${y}`, x, y, x + 1, y + 1)),
		);
		const mends: Mend[] = [
			{ kind: 'drop', key: '11' },
			{ kind: 'fill', at: [1.5, 1.5], into: '01' },
		];
		const { read } = await mended(nine, mends);
		expect(read.coverage.keys).not.toContain('11');
		expect(pairsOf(read)).toContain('01-21 line');
		expect(about(read.findings, 'mended').map(({ regions }) => regions)).toEqual([[], ['01']]);
		// and a region left out twice over is one step
		const again = await mended(nine, [mends[0], ...mends]);
		expect(again.read.coverage).toEqual(read.coverage);
	});
	it('join a region into another, attributes and all', async () => {
		const three = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1), box('c', 2, 0, 3, 1)];
		const { read } = await mended(three, [{ kind: 'merge', key: 'b', into: 'a' }]);
		expect(read.coverage.keys).toEqual(['a', 'c']);
		const known = new Set(read.coverage.keys);
		const spoken = read.findings.flatMap(({ regions }) => regions);
		expect(spoken.every((key) => known.has(key))).toBe(true);
		expect(read.attributes.rows).toHaveLength(2);
		expect(pairsOf(read)).toEqual(['a-c line']);
		expect(read.coverage.partRings).toHaveLength(3); // two parts and the end
		// two that overlap become one with no land counted twice
		const over = await mended(four, [{ kind: 'merge', key: 'e', into: 'w' }]);
		const { union, sum } = await unionAndSum(over.features);
		expect(sum).toBeCloseTo(union, 9);
		expect((await unionAndSum(four)).union).toBeCloseTo(union, 9);
	});
	it('give the same map whatever the order of features', async () => {
		for (const { code, map } of Object.values(dirtyMaps)) {
			const [{ offers }] = about((await acceptedFeatures(map)).findings, code);
			const mends = (offers ?? []).slice(0, 1).map(({ mend }) => mend);
			const one = await mended(map, mends);
			const two = await mended(map.toReversed(), mends);
			expect(pairsOf(two.read)).toEqual(pairsOf(one.read));
		}
	});
	it('find the same faults at the same places when they are replayed on a mended map', async () => {
		const gone = dirtyMaps['a gap between four'].map;
		const [{ offers }] = about((await acceptedFeatures(gone)).findings, 'gap');
		const mend = (offers ?? [])[0].mend;
		const { read } = await mended(gone, [mend]);
		expect(places(read.findings, 'gap')).toEqual([]);
		const twice = await acceptedFeatures(gone, { mends: [mend, { ...mend, into: 'n' } as Mend] });
		expect(about(twice.findings, 'mend-not-applied')).toHaveLength(1);
	});
});

describe('outlines that are too much to cut', () => {
	it('are left as they are, and that is told', async () => {
		// 200 corners in no order: about 0.23 crossings a pair of edges, so some 4,500
		let x = 7;
		const next = () => (x = (x * 16807) % 2147483647) / 2147483647;
		const knot = region(
			'knot',
			Array.from({ length: 200 }, () => [next(), next()]),
		);
		const map = [knot, box('e', 0.9, 0, 2, 1)];
		const mends: Mend[] = [
			{ kind: 'untangle', key: 'knot' },
			{ kind: 'settle', a: 'knot', b: 'e', keep: 'e' },
		];
		const { findings } = await acceptedFeatures(map, { mends });
		const told = about(findings, 'mend-not-applied').map(({ message }) => message);
		expect(told).toHaveLength(2);
		for (const message of told) expect(message).toMatch(/cross in more than 1000 places/);
	});
});
