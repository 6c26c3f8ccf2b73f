import type { Point } from './cells.ts';

/** One district as a careless supplier has it. */
export interface Copy {
	code: string;
	label: string;
	polygons: Point[][][];
}

/** A place on the border of two districts: the position `at` of the outer ring of one of them. */
export interface Site {
	ring: Point[];
	at: number;
	owner: Copy;
}

/** About a metre of latitude, in degrees. */
export const metre = 1 / 111_200;

/** One site for each of many districts, no two of them on the same district. */
export function quietSites(copies: Copy[]): Site[] {
	const owners = new Map<string, Copy[]>();
	for (const copy of copies) {
		const own = new Set(copy.polygons.flat(2).map((point) => point.join()));
		for (const key of own) owners.set(key, [...(owners.get(key) ?? []), copy]);
	}
	const taken = new Set<Copy>();
	return copies.flatMap((owner) => {
		const ring = owner.polygons[0][0];
		const pair = (at: number) => owners.get(ring[at].join()) ?? [];
		const at = ring.findIndex((_, i) => {
			const both = pair(i);
			const run = [i - 2, i - 1, i + 1, i + 2];
			return (
				i > 2 &&
				i < ring.length - 3 &&
				both.length === 2 &&
				!both.some((copy) => taken.has(copy)) &&
				run.every((near) => pair(near).length === 2 && pair(near).every((c) => both.includes(c)))
			);
		});
		if (at < 0) return [];
		pair(at).forEach((copy) => taken.add(copy));
		return [{ ring, at, owner }];
	});
}

/** Moves one corner on one side of the border only: outwards it overlaps, inwards it leaves a gap. */
export function shift(site: Site, degrees: number): void {
	site.ring[site.at] = beyond(site, degrees);
}

/** The position straight across the border from a site, positive into the other district. */
export function beyond({ ring, at }: Site, degrees: number): Point {
	const [before, here, after] = [ring[at - 1], ring[at], ring[at + 1]];
	const narrow = Math.cos((here[1] * Math.PI) / 180);
	const [dx, dy] = [(after[0] - before[0]) * narrow, after[1] - before[1]];
	const length = Math.hypot(dx, dy);
	return [
		tidy(here[0] + ((dy / length) * degrees) / narrow),
		tidy(here[1] - (dx / length) * degrees),
	];
}

export function tidy(degrees: number): number {
	return Math.round(degrees * 1e10) / 1e10;
}
