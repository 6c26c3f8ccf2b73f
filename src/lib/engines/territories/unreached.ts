import { blockMayEndIn, fixedUnits } from './block-rules.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible } from './problem.ts';
import { listed } from './words.ts';

/**
 * A free unit that no territory can reach: each one where it may end has a base or a fixed unit, and none
 * of these is joined to it by a chain of units that may end there. Null when every unit can be reached.
 */
export function unreached(prepared: Prepared): Impossible | null {
	const { open, steps, fixed, units } = prepared;
	const anchored = fixedUnits(prepared);
	const floating = Array.from(open.keys()).filter((t) => open[t] && anchored[t].length === 0);
	if (floating.length > 0 && !steps) return null;
	const reached = new Uint8Array(units);
	const lostOne = () => fixed.findIndex((t, u) => t < 0 && !reached[u]);
	if (steps) {
		reachEach(prepared, anchored, reached, true);
		if (lostOne() < 0) return null;
		reachEach(prepared, anchored, reached, false);
	} else reachAll(prepared, anchored, reached);
	for (const t of floating) {
		for (let u = 0; u < units; u++) if (blockMayEndIn(prepared, u, t)) reached[u] = 1;
	}
	const lost = lostOne();
	if (lost < 0) return null;
	const where = Array.from(open.keys()).filter((t) => blockMayEndIn(prepared, lost, t));
	const roots = where.map((t) => anchored[t][0]);
	return {
		status: 'impossible',
		reason: 'lock-cut-off',
		message: `No territory in which #${lost} may end can reach it from ${listed(roots)}.`,
		witness: { units: [lost], territories: where },
		relief: [],
	};
}

/** Without a reach rule every open territory may take every free unit: one walk from all of them. */
function reachAll(
	{ graph, fixed, open }: Prepared,
	anchored: number[][],
	reached: Uint8Array,
): void {
	const queue = anchored.flatMap((units, t) => (open[t] ? units : []));
	for (const v of queue) reached[v] = 1;
	for (let head = 0; head < queue.length; head++) {
		const v = queue[head];
		for (let i = graph.offsets[v]; i < graph.offsets[v + 1]; i++) {
			const w = graph.targets[i];
			if (reached[w] || fixed[w] >= 0) continue;
			reached[w] = 1;
			queue.push(w);
		}
	}
}

/** With a reach rule a walk for each territory; `own`: only through its own units of today, a quick try. */
function reachEach(
	prepared: Prepared,
	anchored: number[][],
	reached: Uint8Array,
	own: boolean,
): void {
	const { offsets, targets } = prepared.graph;
	const { today } = prepared.problem;
	anchored.forEach((units, t) => {
		if (!prepared.open[t] || units.length === 0) return;
		const piece = new Set([units[0]]);
		for (const v of piece) {
			reached[v] = 1;
			for (let i = offsets[v]; i < offsets[v + 1]; i++) {
				const w = targets[i];
				if (piece.has(w) || (own && today[w] !== t)) continue;
				if (blockMayEndIn(prepared, w, t)) piece.add(w);
			}
		}
	});
}
