import { differenceCiede2000, lab65, type Rgb } from 'culori';
import { describe, expect, it } from 'vitest';
import { linearOf, seenLinear } from '../colour/index.ts';
import {
	housePalettes,
	proposeMends,
	publishedPalettes,
	readers,
	type AskedOfInks,
	type Ink,
	type Proposal,
	type ProposalRequest,
} from './index.ts';

const demand = (a: number, b: number, ciede2000: number): AskedOfInks => ({
	...{ a, b, ciede2000, grey: 5, sizesMm: [20, 20] },
});
const allPairs = (count: number, asked: (a: number, b: number) => number) =>
	Array.from({ length: count }, (_, b) => b).flatMap((b) =>
		Array.from({ length: b }, (_, a) => demand(a, b, asked(a, b))),
	);
const inksOf = (id: string): Ink[] =>
	publishedPalettes.find((one) => one.id === id)?.inks ?? expect.fail(id);
const known = [...housePalettes, ...publishedPalettes];
const answers = (request: Partial<ProposalRequest> & Pick<ProposalRequest, 'inks' | 'demands'>) => [
	...proposeMends({ locked: [], known, ...request }),
];
const proposals = (list: ReturnType<typeof answers>): Proposal[] =>
	list.flatMap((answer) => ('proposal' in answer ? [answer.proposal] : []));

/** What culori finds between two inks for a reader: a measure apart from the engine's. */
function measured(one: string, two: string, reader: (typeof readers)[number]): number {
	const [a, b] = [one, two].map((text) => {
		const [r, g, b] = seenLinear(linearOf(text), reader);
		return lab65({ mode: 'lrgb', r, g, b } as unknown as Rgb);
	});
	return reader === 'grey' ? Math.abs(a.l - b.l) : differenceCiede2000()(a, b);
}

function expectToMeet({ inks }: Proposal, demands: readonly AskedOfInks[]) {
	for (const { a, b, ciede2000, grey } of demands)
		for (const reader of readers) {
			const asked = reader === 'grey' ? grey : ciede2000;
			expect(measured(inks[a], inks[b], reader)).toBeGreaterThanOrEqual(asked - 1e-3);
		}
}

describe('mends side by side', () => {
	const inks = inksOf('brewer-set1').slice(0, 5);
	const demands = allPairs(5, (a, b) => (b - a === 1 ? 15 : 10));
	const list = answers({ inks, demands, locked: [0] });

	it('are four, each by its kind, and each keeps what is asked pair by pair, by another measure', () => {
		expect(list.map((answer) => ('kind' in answer ? answer.kind : answer.status))).toEqual([
			...['fewest', 'least', 'grey', 'known'],
		]);
		expect(proposals(list)).toHaveLength(4);
		for (const proposal of proposals(list)) expectToMeet(proposal, demands);
	});

	it('leave locked inks alone, and tell moves as culori measures them', () => {
		for (const { inks: after, moves, moved, total } of proposals(list)) {
			expect([after[0], moves[0]]).toEqual([inks[0].hex, 0]);
			expect(moved).toBe(after.filter((hex, i) => hex !== inks[i].hex).length);
			expect(total).toBeCloseTo(
				moves.reduce((sum, one) => sum + one, 0),
				9,
			);
			after.forEach((hex, i) => {
				expect(moves[i]).toBeCloseTo(measured(inks[i].hex, hex, 'typical'), 2);
			});
		}
	});

	it('are what they say: fewest inks, least movement, widest gaps for grey print, a set that is known', () => {
		const [fewest, least, grey, set] = proposals(list);
		for (const other of [least, grey, set]) {
			expect(fewest.moved).toBeLessThanOrEqual(other.moved);
			expect(least.total).toBeLessThanOrEqual(other.total + 1e-9);
		}
		expect(grey.leastGrey).toBeGreaterThanOrEqual(8);
		expect(known.map(({ name }) => name)).toContain(set.from);
	});

	it('are the same for the same seed', () => {
		expect(answers({ inks, demands, locked: [0] })).toEqual(list);
	});
});

describe('no mend', () => {
	it('is needed where every pair has what its size asks', () => {
		const inks = inksOf('tol-high-contrast');
		expect(answers({ inks, demands: allPairs(3, () => 10) })).toEqual([{ status: 'not-needed' }]);
	});

	it('is possible where two locked inks touch: named with reader and value', () => {
		const inks = inksOf('brewer-set1');
		const [red, brown] = [0, 6];
		expect(answers({ inks, demands: [demand(red, brown, 15)], locked: [red, brown] })).toEqual([
			{
				status: 'impossible',
				reason:
					'Red and Brown touch and are both locked, and they differ by 3.11 in CIEDE2000 for protan readers where 15 is asked',
			},
		]);
	});

	it('is asked of a pair that its hatches tell apart', () => {
		const hatch = {
			kind: 'crossed',
			angle: 45,
			spacingMm: 2,
			widthMm: 0.3,
			hex: '#ffffff',
		} as const;
		const inks = inksOf('brewer-set1').map((ink, i) => (i === 6 ? { ...ink, hatch } : ink));
		expect(answers({ inks, demands: [demand(0, 6, 15)] })).toEqual([{ status: 'not-needed' }]);
	});

	it('is claimed impossible by a demand beyond the best known, only not found', () => {
		const list = answers({
			inks: inksOf('brewer-set2').slice(0, 5),
			demands: allPairs(5, () => 40),
		});
		expect(list).toHaveLength(4);
		expect(list[0]).toEqual({
			...{ kind: 'fewest', status: 'not-found' },
			reason: '40 is asked of 5 inks that all touch; the best found for so many is 27.3',
		});
	});
});
