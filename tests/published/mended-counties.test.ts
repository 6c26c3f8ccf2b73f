import { expect, it } from 'vitest';
import {
	coverageFaults,
	coverageToGeoJson,
	type Mend,
} from '../../src/lib/engines/boundaries/index.ts';
import { bytesOf, usAtlas } from '../support/atlas.ts';
import { allValid, unionAndSum } from '../support/geos-areas.ts';
import { accepted, pairsOf } from '../support/read-boundaries.ts';

it('the counties of us-atlas, whose outlines were cut coarser by its maker, can be mended clean', async () => {
	const bytes = bytesOf(usAtlas('counties'));
	const read = (mends: Mend[]) => accepted(bytes, { mends });
	const offered = ({ findings }: Awaited<ReturnType<typeof read>>) =>
		findings.filter(({ offers }) => offers?.length);
	const first = await read([]);
	expect(offered(first).map(({ code }) => code)).toEqual([
		...Array(6).fill('overlap'),
		...Array(4).fill('self-crossing'),
	]);
	const concerned = new Set(offered(first).flatMap(({ regions }) => regions));
	let mends: Mend[] = [];
	let last = first;
	for (let round = 0; round < 5 && offered(last).length > 0; round++) {
		const usual = offered(last).flatMap(({ offers }) => offers!.filter((offer) => offer.usual));
		mends = [...mends, ...usual.map(({ mend }) => mend)];
		last = await read(mends);
		expect(coverageFaults(last.coverage)).toEqual([]);
	}
	expect(offered(last)).toEqual([]);
	expect(last.findings.filter(({ code }) => code === 'mend-not-applied')).toEqual([]);
	// the counties that overlapped are areas that share no land any more, by GEOS
	const { features } = coverageToGeoJson(last.coverage);
	const near = features.filter(({ id }) => concerned.has(String(id)));
	expect(near.length).toBe(concerned.size);
	expect(await allValid(near)).toBe(true);
	const { union, sum } = await unionAndSum(near);
	expect(sum).toBeCloseTo(union, 9);
	// and all others have the neighbours they had
	const apart = (pair: string) =>
		!pair
			.split(' ')[0]
			.split('-')
			.some((key) => concerned.has(key));
	expect(pairsOf(last).filter(apart)).toEqual(pairsOf(first).filter(apart));
}, 300_000);
