import { checkRefutation } from './check-refutation.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/** What is wrong with the proof that no fewer inks do: pairs are looked up in the problem's own lists. */
export function checkProof(problem: ColouringProblem, result: Coloured): string[] {
	const { regions, kind } = result.proof;
	if (kind === 'not-proved') return [];
	if (!regions.every((r) => Number.isInteger(r) && r >= 0 && r < problem.regions)) {
		return ['The proof names a region that does not exist.'];
	}
	if (new Set(regions).size !== regions.length) return ['The proof names a region twice.'];
	const borders = bordersAmong(problem, regions);
	const touch = (a: number, b: number) => borders.has(a * problem.regions + b);
	switch (kind) {
		case 'none-needed':
			return result.inksUsed <= 1 ? [] : ['More than one ink needs a proof.'];
		case 'edge':
			return regions.length === 2 ? clique(regions, result.inksUsed, touch) : ['No single border.'];
		case 'clique':
			return clique(regions, result.inksUsed, touch);
		case 'odd-cycle':
			return [...ring(regions, touch), ...needs(3, result.inksUsed)];
		case 'odd-wheel':
			return [...wheel(regions, touch), ...needs(4, result.inksUsed)];
		case 'refutation':
			return checkRefutation(problem, result);
	}
}

function bordersAmong(problem: ColouringProblem, regions: number[]): Set<number> {
	const among = new Set(regions);
	const borders = new Set<number>();
	const add = (a: number, b: number) => {
		if (!among.has(a) || !among.has(b)) return;
		borders.add(a * problem.regions + b);
		borders.add(b * problem.regions + a);
	};
	const { a, b } = problem.borders;
	for (let i = 0; i < a.length; i++) add(a[i], b[i]);
	for (const [p, q] of problem.apart ?? []) add(p, q);
	return borders;
}

type Touch = (a: number, b: number) => boolean;

const needs = (shown: number, used: number) =>
	shown === used ? [] : [`The proof shows ${shown} inks, not ${used}.`];

function clique(regions: number[], inks: number, touch: Touch): string[] {
	const apart = regions.some((r, i) => regions.some((s, j) => j > i && !touch(r, s)));
	return [
		...(apart ? ['Two regions of the clique do not border.'] : []),
		...needs(regions.length, inks),
	];
}

function ring(regions: number[], touch: Touch): string[] {
	if (regions.length < 3 || regions.length % 2 === 0) return ['The ring is not of odd length.'];
	const open = regions.some((r, i) => !touch(r, regions[(i + 1) % regions.length]));
	return open ? ['Two regions that follow each other in the ring do not border.'] : [];
}

function wheel([hub, ...rim]: number[], touch: Touch): string[] {
	const loose = rim.some((r) => !touch(hub, r));
	return [...(loose ? ['A region of the rim does not border the hub.'] : []), ...ring(rim, touch)];
}
