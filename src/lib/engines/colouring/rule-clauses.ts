import type { ColouringProblem } from './problem.ts';
import { reservedByRegion } from './reserved.ts';

/**
 * The clauses of a problem on some of its regions: the variable of the i-th of `regions` (from 1) and
 * ink c is (i - 1) * inks + c + 1. `needs[i]` says that it has an ink; `rules` holds the borders, keep
 * apart and keep alike among them, and their locks, forbidden and reserved inks.
 */
export function ruleClauses(
	problem: ColouringProblem,
	regions: ArrayLike<number>,
	inks: number,
): { needs: number[][]; rules: number[][] } {
	const place = new Map<number, number>();
	for (let i = 0; i < regions.length; i++) place.set(regions[i], i);
	const variable = (i: number, ink: number) => i * inks + ink + 1;
	const everyInk = Array.from({ length: inks }, (_, ink) => ink);
	const needs = Array.from({ length: regions.length }, (_, i) =>
		everyInk.map((ink) => variable(i, ink)),
	);
	const rules: number[][] = [];
	const pair = (
		a: number,
		b: number,
		clauses: (i: number, j: number, ink: number) => number[][],
	) => {
		const [i, j] = [place.get(a), place.get(b)];
		if (i === undefined || j === undefined) return;
		for (const ink of everyInk) rules.push(...clauses(i, j, ink));
	};
	const differ = (i: number, j: number, ink: number) => [[-variable(i, ink), -variable(j, ink)]];
	const same = (i: number, j: number, ink: number) => [
		[-variable(i, ink), variable(j, ink)],
		[variable(i, ink), -variable(j, ink)],
	];
	const { borders, apart, alike, forbidden, locks } = problem;
	for (let e = 0; e < borders.a.length; e++) pair(borders.a[e], borders.b[e], differ);
	for (const [a, b] of apart ?? []) pair(a, b, differ);
	for (const [a, b] of alike ?? []) pair(a, b, same);
	for (const [region, ink] of forbidden ?? []) {
		const i = place.get(region);
		if (i !== undefined && ink < inks) rules.push([-variable(i, ink)]);
	}
	const reserved = reservedByRegion(problem);
	for (const ink of reserved?.inks ?? []) {
		if (ink >= inks) continue;
		for (const [region, i] of place) {
			if (reserved?.keptFrom(region, ink)) rules.push([-variable(i, ink)]);
		}
	}
	for (const [region, i] of locks ? place : []) {
		const locked = (locks as Int32Array)[region];
		if (locked < 0) continue;
		for (const ink of everyInk) if (ink !== locked) rules.push([-variable(i, ink)]);
	}
	return { needs, rules };
}
