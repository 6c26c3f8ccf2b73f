import type { Coverage } from '../coverage.ts';
import { Crossed } from './crossings.ts';
import {
	areasOf,
	aroundTheWorld,
	km2PerUnit,
	planeArcs,
	turned,
	widthOf,
	type PlaneArcs,
} from './plane-arcs.ts';
import { walkDrawing } from './walk-drawing.ts';

/** An old and a new region with ground in common. */
export interface Common {
	from: number;
	to: number;
	/** share (0 to 1) of the old region's area, and of the new one's */
	shareOfOld: number;
	shareOfNew: number;
}

/**
 * The area that each old region has in common with each new one, for regions that are wanted on either
 * side. The outline of a common area is made of pieces of both outlines; areas are summed over these
 * pieces (Green's theorem), so no polygon is ever cut. Longitudes may be unwrapped otherwise in the two
 * coverages: whole turns are tried. Regions that overlap within one coverage each count.
 * Edges are straight in the equal-area cylindrical plane, as for the areas of a coverage.
 */
export function commonGround(
	before: Coverage,
	after: Coverage,
	wantedOld: (region: number) => boolean,
	wantedNew: (region: number) => boolean,
): Common[] {
	const old = planeArcs(before, wantedOld);
	const fresh = planeArcs(after, wantedNew);
	const units = new Map<number, number>();
	for (const turns of turnsBetween(old, fresh)) {
		addCommon(old, turned(fresh, turns), after.keys.length, units);
	}
	const oldAreas = areasOf(old, before.keys.length);
	const newAreas = areasOf(fresh, after.keys.length);
	const share = (km2: number, whole: number) =>
		whole > 0 ? Math.min(1, Math.max(0, km2 / whole)) : 0;
	return Array.from(units, ([pair, area]) => {
		const from = Math.floor(pair / after.keys.length);
		const to = pair % after.keys.length;
		const km2 = area * km2PerUnit;
		return {
			from,
			to,
			shareOfOld: share(km2, oldAreas[from]),
			shareOfNew: share(km2, newAreas[to]),
		};
	});
}

/** Whole turns by which the new drawing comes to lie on the old one. */
function turnsBetween(old: PlaneArcs, fresh: PlaneArcs): number[] {
	const [west, east] = widthOf(old);
	const [newWest, newEast] = widthOf(fresh);
	if (west > east || newWest > newEast) return [];
	const turns: number[] = [];
	const first = Math.ceil((west - newEast) / aroundTheWorld);
	const last = Math.floor((east - newWest) / aroundTheWorld);
	for (let turn = first; turn <= last; turn++) turns.push(turn);
	return turns;
}

function addCommon(
	old: PlaneArcs,
	fresh: PlaneArcs,
	newRegions: number,
	units: Map<number, number>,
): void {
	const add = (from: number, to: number, area: number) => {
		if (from < 0 || to < 0) return;
		const pair = from * newRegions + to;
		units.set(pair, (units.get(pair) ?? 0) + area);
	};
	walkDrawing(old, new Crossed(fresh, 1), (arc, swept, { regions, counts }) => {
		for (let k = 0; k < regions.length; k++) {
			add(old.left[arc], regions[k], swept * counts[k]);
			add(old.right[arc], regions[k], -swept * counts[k]);
		}
	});
	walkDrawing(fresh, new Crossed(old, -1), (arc, swept, { regions, counts }) => {
		for (let k = 0; k < regions.length; k++) {
			add(regions[k], fresh.left[arc], swept * counts[k]);
			add(regions[k], fresh.right[arc], -swept * counts[k]);
		}
	});
}
