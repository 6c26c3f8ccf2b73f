import { describe, expect, it } from 'vitest';
import {
	acceptedFeatures,
	box,
	metresOf,
	pairsOf,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import { karneyMetres } from '../geometry/index.ts';
import { coverageFaults, decodeCoverage, encodeCoverage, type BoundaryOptions } from './index.ts';

const codes = (read: { findings: { code: string }[] }) => read.findings.map((f) => f.code);

async function read(features: Parameters<typeof acceptedFeatures>[0], options?: BoundaryOptions) {
	const result = await acceptedFeatures(features, options);
	expect(coverageFaults(result.coverage)).toEqual([]);
	expect(decodeCoverage(encodeCoverage(result.coverage))).toEqual(result.coverage);
	return result;
}

describe('borders that were not drawn alike', () => {
	it('T-junctions: one long edge against two short ones', async () => {
		const t = await read([box('w', 0, 0, 1, 2), box('n', 1, 1, 2, 2), box('s', 1, 0, 2, 1)]);
		expect(pairsOf(t)).toEqual(['n-s line', 'n-w line', 's-w line']);
		expect(metresOf(t)['n-w']).toBeCloseTo(karneyMetres(1, 1, 1, 2), 0);
		expect(codes(t)).toContain('vertices-joined');
	});

	it('T-junctions on slanted edges, where the corner is on the line only but for rounding', async () => {
		const w = region('w', [
			[0, 0],
			[1, 0],
			[1.3, 0.7],
			[0, 1],
		]);
		const e = region(
			'e',
			[
				[1, 0],
				[2, 0],
				[1.3, 0.7],
				[1.1, 0.7 / 3],
				[1.2, 1.4 / 3],
			].toSorted(byAngle),
		);
		expect(pairsOf(await read([w, e]))).toEqual(['e-w line']);
	});

	it('noise in the last decimals', async () => {
		const e = region('e', [
			[1 + 1e-8, 0],
			[2, 0],
			[2, 1],
			[1 - 1e-8, 1 + 3e-8],
		]);
		const noisy = await read([box('w', 0, 0, 1, 1), e]);
		expect(pairsOf(noisy)).toEqual(['e-w line']);
	});

	it('a gap is joined only within the tolerance asked for, and the pair gained is told', async () => {
		// 0.0005 degrees at the equator are about 56 m.
		const apart = [box('w', 0, 0, 1, 1), box('e', 1.0005, 0, 2, 1)];
		expect(pairsOf(await read(apart))).toEqual([]);
		expect(pairsOf(await read(apart, { toleranceMetres: 30 }))).toEqual([]);
		const joined = await read(apart, { toleranceMetres: 100 });
		expect(pairsOf(joined)).toEqual(['e-w line']);
		expect(metresOf(joined)['e-w']).toBeCloseTo(karneyMetres(1, 0, 1, 1), -3);
		const gained = joined.findings.find((f) => f.code === 'pairs-gained');
		expect(gained?.regions.toSorted()).toEqual(['e', 'w']);
	});

	it('a ragged gap is joined to one line, not a zigzag', async () => {
		const steps = Array.from({ length: 21 }, (_, i) => i / 20);
		const w = region('w', [[0, 0], ...steps.map((y, i) => [1 - (i % 2) * 1e-4, y]), [0, 1]]);
		const e = region('e', [
			[2, 1],
			...steps.map((y, i) => [1.0003 + ((i + 1) % 2) * 1e-4, y * 0.999]).toReversed(),
			[2, 0],
		]);
		const joined = await read([w, e], { toleranceMetres: 100 });
		expect(pairsOf(joined)).toEqual(['e-w line']);
		expect(metresOf(joined)['e-w'] / karneyMetres(1, 0, 1, 1)).toBeCloseTo(1, 2);
	});
});

const byAngle = (p: number[], q: number[]) =>
	Math.atan2(p[1] - 0.2, p[0] - 1.4) - Math.atan2(q[1] - 0.2, q[0] - 1.4);

describe('overlaps', () => {
	it('are line borders with half the outline of what is common, and a finding', async () => {
		const over = await read([box('w', 0, 0, 1, 1), box('e', 0.9, 0.2, 2, 0.8)]);
		expect(pairsOf(over)).toEqual(['e-w line']);
		const half = karneyMetres(0.9, 0.2, 0.9, 0.8) + karneyMetres(0.9, 0.5, 1, 0.5);
		expect(metresOf(over)['e-w'] / half).toBeCloseTo(1, 4);
		const finding = over.findings.find((f) => f.code === 'overlap');
		expect(finding?.regions.toSorted()).toEqual(['e', 'w']);
		// 11.13 km by 66.34 km
		expect(finding?.message).toMatch(/73[89] km²/);
	});
	it('one inside the other without a hole', async () => {
		const inside = await read([box('big', 0, 0, 3, 3), box('small', 1, 1, 2, 2)]);
		expect(pairsOf(inside)).toEqual(['big-small line']);
		expect(codes(inside)).toContain('overlap');
	});
	it('the same region twice', async () => {
		const twice = await read([box('a', 0, 0, 1, 1), box('b', 0, 0, 1, 1)]);
		expect(pairsOf(twice)).toEqual(['a-b line']);
		expect(codes(twice)).toEqual(['duplicate-region']);
		const around =
			karneyMetres(0, 0, 1, 0) + 2 * karneyMetres(0, 0, 0, 1) + karneyMetres(0, 1, 1, 1);
		expect(metresOf(twice)['a-b']).toBeCloseTo(around / 2, 3);
	});
	it('a region laid over many, also those it does not touch', async () => {
		const small = [0, 1, 2].flatMap((x) =>
			[0, 1, 2].map((y) => box(`${x}${y}`, x, y, x + 1, y + 1)),
		);
		const over = await read([...small, box('all', 0, 0, 3, 3)]);
		const withAll = pairsOf(over).filter((pair) => pair.includes('all'));
		expect(withAll).toHaveLength(9);
	});
	it('sharing an edge and poking over it', async () => {
		const poke = region('e', [
			[1, 0],
			[2, 0],
			[2, 1],
			[1, 1],
			[1, 0.8],
			[0.8, 0.8],
			[0.8, 0.6],
			[1, 0.6],
		]);
		const over = await read([box('w', 0, 0, 1, 1), poke]);
		expect(pairsOf(over)).toEqual(['e-w line']);
		expect(codes(over)).toContain('overlap');
	});
});

describe('holes', () => {
	/** Two boxes with a notch in the right one, so deep in degrees, closed above and below. */
	const notched = (deep: number) => [
		box('w', 0, 0, 1, 1),
		region('e', [
			[1, 0],
			[2, 0],
			[2, 1],
			[1, 1],
			[1, 0.6],
			[1 + deep, 0.5],
			[1, 0.4],
		]),
	];
	const holes = async (deep: number, ...more: ReturnType<typeof box>[]) => {
		const { findings } = await read([...notched(deep), ...more]);
		return findings.filter(({ code }) => /sliver|gap/.test(code));
	};
	it('between regions are told as slivers or gaps by their mean width', async () => {
		// At 0.5 degrees north one degree of longitude is about 111.3 km: 33 m and 1.1 km deep.
		const [sliver] = await holes(0.0003);
		expect(sliver.code).toBe('sliver');
		// half of 33.4 m by 22.1 km
		expect(sliver.message).toMatch(/0\.37 km² between w and e .*17 m wide/);
		expect(sliver.regions.toSorted()).toEqual(['e', 'w']);
		expect(sliver.at?.[0]).toBeCloseTo(1, 3);
		expect((await holes(0.0007)).map(({ code }) => code)).toEqual(['sliver']);
		const [gap] = await holes(0.0015);
		expect(gap.code).toBe('gap');
	});
	it('wide ones are lakes, and what another region covers is none', async () => {
		expect(await holes(0.05)).toEqual([]);
		expect(await holes(0.0003, box('over', 0.9, 0.3, 1.1, 0.7))).toEqual([]);
	});
});

describe('shapes that need care', () => {
	it('four regions at a point: lines around, points across', async () => {
		const four = [
			box('a', 0, 0, 1, 1),
			box('b', 1, 0, 2, 1),
			box('c', 0, 1, 1, 2),
			box('d', 1, 1, 2, 2),
		];
		expect(pairsOf(await read(four))).toEqual([
			'a-b line',
			'a-c line',
			'a-d point',
			'b-c point',
			'b-d line',
			'c-d line',
		]);
	});
	it('a corner on the middle of an edge is a point touch', async () => {
		const tip = region('tip', [
			[1, 0.5],
			[2, 0.2],
			[2, 0.8],
		]);
		expect(pairsOf(await read([box('w', 0, 0, 1, 1), tip]))).toEqual(['tip-w point']);
	});
	it('enclave: fills the hole, or lies free in it', async () => {
		const hole = [
			[1, 1],
			[1, 2],
			[2, 2],
			[2, 1],
		];
		const around = region(
			'around',
			[
				[0, 0],
				[3, 0],
				[3, 3],
				[0, 3],
			],
			hole,
		);
		for (const inner of [box('in', 1, 1, 2, 2), box('in', 1.2, 1.2, 1.8, 1.8)]) {
			const { coverage } = await read([around, inner]);
			expect([...coverage.enclaveOf]).toEqual([-1, 0]);
		}
		const outside = await read([around, box('out', 4, 4, 5, 5)]);
		expect([...outside.coverage.enclaveOf]).toEqual([-1, -1]);
	});
	it('a spike is dropped', async () => {
		const spiked = region('s', [
			[0, 0],
			[1, 0],
			[1, 1],
			[0.5, 1],
			[0.5, 2],
			[0.5, 1],
			[0, 1],
		]);
		const { coverage, findings } = await read([spiked]);
		expect(Math.max(...coverage.arcPoints)).toBe(1);
		expect(findings.map(({ code, at }) => [code, at])).toEqual([['spike-dropped', [0.5, 2]]]);
	});
	it('regions that touch only along a tongue of no width are told, and are no neighbours', async () => {
		const tongue = region('t', [
			[0, 0],
			[1, 0],
			[1, 0.5],
			[3, 0.5],
			[1, 0.5],
			[1, 1],
			[0, 1],
		]);
		const far = [box('s', 2, 0, 3, 0.5), box('n', 2, 0.5, 3, 1)];
		const read3 = await read([tongue, ...far]);
		expect(pairsOf(read3)).toEqual(['n-s line']);
		const told = read3.findings.find(({ code }) => code === 'touch-without-width');
		expect(told?.message).toMatch(/n and t; s and t\.$/);
		expect(told?.regions.toSorted()).toEqual(['n', 's', 't']);
	});
	it('an unclosed outline is closed and told', async () => {
		const open = box('a', 0, 0, 1, 1);
		open.geometry.coordinates[0].pop();
		expect(codes(await read([open]))).toContain('ring-closed');
	});
	it('a region without area is left out and told, and the rest stays', async () => {
		const flat = region('flat', [
			[0, 0],
			[1, 0],
			[2, 0],
		]);
		const rest = await read([box('a', 0, 0, 1, 1), flat]);
		expect(rest.coverage.keys).toEqual(['a']);
		expect(rest.findings.find((f) => f.code === 'no-area')?.message).toContain('number 2');
	});
	it('an outline that crosses itself is told', async () => {
		const bow = region('bow', [
			[0, 0],
			[2, 2],
			[2, 0],
			[0, 1],
		]);
		expect(codes(await read([bow]))).toContain('self-crossing');
	});
});
