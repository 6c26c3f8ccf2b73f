import { blockMayEndIn, fixedUnits } from './block-rules.ts';
import { pinReliefs, pinsOf } from './pins.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Impossible, Relief, TerritoryProblem } from './problem.ts';
import { thatHelp } from './relieve.ts';

/**
 * Units fixed to one territory (base, locks, frozen) that no chain of units which may end there joins.
 * Null when there are none. The witness is the unit that is cut off and one it cannot reach; the relief
 * takes away its own lock, or a rule on a unit just outside the piece it sits in, where that helps.
 */
export function cutOff(prepared: Prepared): Impossible | null {
	const found = find(prepared);
	if (!found) return null;
	const { problem } = prepared;
	const again = (eased: TerritoryProblem) => {
		const next = prepare(eased);
		return 'status' in next ? next : (find(next)?.fault ?? null);
	};
	const reliefs = candidates(problem, found);
	return { ...found.fault, relief: thatHelp(problem, found.fault, reliefs, again) };
}

interface Found {
	fault: Impossible;
	/** units that the cut-off one can reach */
	piece: Set<number>;
}

function find(prepared: Prepared): Found | null {
	const fixed = fixedUnits(prepared);
	for (let t = 0; t < prepared.territories; t++) {
		const [root, ...others] = fixed[t];
		if (!prepared.stays[t] || others.length === 0) continue;
		const missing = new Set(others);
		pieceAround(prepared, root, t, missing);
		if (missing.size === 0) continue;
		const [lost] = missing;
		const piece = pieceAround(prepared, lost, t, new Set([root]));
		return { fault: told(prepared, root, lost, t), piece };
	}
	return null;
}

/** Units joined to `root` through units that may end in `t`; stops when none of `missing` is left. */
function pieceAround(
	prepared: Prepared,
	root: number,
	t: number,
	missing: Set<number>,
): Set<number> {
	const { offsets, targets } = prepared.graph;
	const piece = new Set([root]);
	for (const v of piece) {
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			const w = targets[i];
			if (piece.has(w) || !blockMayEndIn(prepared, w, t)) continue;
			piece.add(w);
			if (missing.delete(w) && missing.size === 0) return piece;
		}
	}
	return piece;
}

function told({ problem }: Prepared, root: number, lost: number, t: number): Impossible {
	const { frozen, base } = problem.territories[t];
	const rest = base === root ? `its base #${root}` : `#${root}`;
	return {
		status: 'impossible',
		reason: 'lock-cut-off',
		message: frozen
			? `@${t} is frozen in pieces: #${lost} is not joined to ${rest}.`
			: `#${lost} must end in @${t}, but no chain of units that may end there joins it to ${rest}.`,
		witness: { units: [lost, root], territories: [t] },
		relief: [],
	};
}

function candidates(problem: TerritoryProblem, { fault, piece }: Found): Relief[] {
	const [territory] = fault.witness.territories;
	const { offsets, targets } = problem.graph;
	const around = new Set<number>();
	for (const v of piece) {
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			if (!piece.has(targets[i])) around.add(targets[i]);
		}
	}
	const pins = pinsOf(problem);
	const own = fault.witness.units.flatMap((u) => pins.filter(({ unit }) => unit === u));
	const walls = pins.filter((pin) => pin.territory !== territory && around.has(pin.unit));
	return [...own, ...walls].flatMap(pinReliefs);
}
