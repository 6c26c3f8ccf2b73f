import type { ReservedInks } from './reserved.ts';

/** Inks a vertex may not have, in compressed rows; most maps have few or none. */
export interface Bans {
	offsets: Uint32Array;
	inks: Uint32Array;
	/** inks kept from every vertex that is not locked to them; null when there are none */
	reserved: ReservedInks | null;
}

/** Rows of the given [vertex, ink] pairs beside the reserved inks, or null when there are neither. */
export function bansOf(
	vertices: number,
	pairs: readonly (readonly [number, number])[],
	reserved: ReservedInks | null = null,
): Bans | null {
	if (pairs.length === 0 && reserved === null) return null;
	const offsets = new Uint32Array(vertices + 1);
	for (const [v] of pairs) offsets[v + 1]++;
	for (let v = 0; v < vertices; v++) offsets[v + 1] += offsets[v];
	const next = offsets.slice(0, -1);
	const inks = new Uint32Array(pairs.length);
	for (const [v, ink] of pairs) inks[next[v]++] = ink;
	return { offsets, inks, reserved };
}

/** Whether the vertex may not have the ink. */
export function banned(bans: Bans | null, v: number, ink: number): boolean {
	if (bans === null) return false;
	if (bans.reserved !== null && bans.reserved.keptFrom(v, ink)) return true;
	for (let i = bans.offsets[v]; i < bans.offsets[v + 1]; i++) if (bans.inks[i] === ink) return true;
	return false;
}

/** Every ink below `inks` that the vertex may not have, each once. */
export function bannedInks(bans: Bans | null, v: number, inks: number): Set<number> {
	const bad = new Set<number>();
	if (bans === null) return bad;
	for (let i = bans.offsets[v]; i < bans.offsets[v + 1]; i++) {
		if (bans.inks[i] < inks) bad.add(bans.inks[i]);
	}
	for (const ink of bans.reserved?.inks ?? []) {
		if (ink < inks && bans.reserved?.keptFrom(v, ink)) bad.add(ink);
	}
	return bad;
}

/** The highest ink that a ban names + 1; 0 when there is none. */
export function inksBanned(bans: Bans | null): number {
	let named = 0;
	for (const ink of bans?.inks ?? []) named = Math.max(named, ink + 1);
	for (const ink of bans?.reserved?.inks ?? []) named = Math.max(named, ink + 1);
	return named;
}
