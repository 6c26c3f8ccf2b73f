/** Inks a vertex may not have, in compressed rows; most maps have few or none. */
export interface Bans {
	offsets: Uint32Array;
	inks: Uint32Array;
}

/** Rows of the given [vertex, ink] pairs, or null when there are none. */
export function bansOf(
	vertices: number,
	pairs: readonly (readonly [number, number])[],
): Bans | null {
	if (pairs.length === 0) return null;
	const offsets = new Uint32Array(vertices + 1);
	for (const [v] of pairs) offsets[v + 1]++;
	for (let v = 0; v < vertices; v++) offsets[v + 1] += offsets[v];
	const next = offsets.slice(0, -1);
	const inks = new Uint32Array(pairs.length);
	for (const [v, ink] of pairs) inks[next[v]++] = ink;
	return { offsets, inks };
}

/** Whether the vertex may not have the ink. */
export function banned(bans: Bans | null, v: number, ink: number): boolean {
	if (bans === null) return false;
	for (let i = bans.offsets[v]; i < bans.offsets[v + 1]; i++) if (bans.inks[i] === ink) return true;
	return false;
}
