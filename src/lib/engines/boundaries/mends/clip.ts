import { fromGeos, toGeos, withList, type Geos } from './geos-areas.ts';
import type { Part } from './parts.ts';

/** Differences and repairs of areas; null where the library gives up. */
export interface Clip {
	/** what of `parts` is not in `taken` */
	difference(parts: Part[], taken: Part[]): Part[] | null;
	/** parts cut where they cross themselves (even-odd) and united where they lie on each other */
	untangled(parts: Part[]): Part[] | null;
}

let loading: Promise<Clip> | null = null;

/**
 * GEOS 3.13 (npm `geos-wasm`, WebAssembly), loaded on first use: its overlay for differences, and its
 * make-valid that keeps every line and counts by even and odd.
 */
export function loadClip(): Promise<Clip> {
	const quiet = { errorHandler: () => undefined, noticeHandler: () => undefined };
	loading ??= import('geos-wasm').then(async ({ default: load }) => clipBy(await load(quiet)));
	return loading;
}

function clipBy(geos: Geos): Clip {
	return {
		difference: (parts, taken) =>
			tried(geos, (keep) => {
				const from = keep(sound(geos, parts));
				return keep(geos.GEOSDifference(from, keep(sound(geos, taken))));
			}),
		untangled: (parts) => tried(geos, (keep) => keep(sound(geos, parts))),
	};
}

/** A valid area: each part made valid by itself, then all united. */
function sound(geos: Geos, parts: Part[]): number {
	const valid = parts.map((part) => {
		const drawn = toGeos(geos, part);
		if (geos.GEOSisValid(drawn) === 1) return drawn;
		const mended = geos.GEOSMakeValid(drawn);
		geos.GEOSGeom_destroy(drawn);
		return mended;
	});
	if (valid.length === 1 || valid.includes(0)) return valid.includes(0) ? 0 : valid[0];
	const collection = withList(geos, valid, (list) =>
		geos.GEOSGeom_createCollection(collectionType, list, valid.length),
	);
	const united = geos.GEOSUnaryUnion(collection);
	geos.GEOSGeom_destroy(collection);
	return united;
}

const collectionType = 7;

/** Runs `work` and frees what it kept; the answer is null when any step of it failed. */
function tried(geos: Geos, work: (keep: (area: number) => number) => number): Part[] | null {
	const kept: number[] = [];
	const keep = (area: number) => {
		if (!area) throw new GaveUp();
		kept.push(area);
		return area;
	};
	try {
		return fromGeos(geos, work(keep));
	} catch (error) {
		if (error instanceof GaveUp) return null;
		// Out of memory ends the whole instance; the library cannot load another one.
		if (error instanceof WebAssembly.RuntimeError) return null;
		throw error;
	} finally {
		for (const area of kept) geos.GEOSGeom_destroy(area);
	}
}

class GaveUp extends Error {}
