import type { Bound } from './bounds.ts';
import type { Prepared } from './prepare.ts';
import type { ReservedInks } from './reserved.ts';

/**
 * So many inks at least: by the bound of the borders, by the locks, and because vertices that are locked
 * to no reserved ink must find the inks of that bound among the others.
 */
export function leastInks({ graph, inksLocked, bans }: Prepared, bound: Bound): number {
	const plain = Math.max(bound.inks, inksLocked);
	const reserved = bans?.reserved ?? null;
	if (reserved === null || bound.inks === 0) return plain;
	const { regions } = bound.proof;
	const without = (v: number) => reserved.opened(v, Infinity) === 0;
	if (!regions.every(without)) return plain;
	if (regions.length === 0 && !anyVertex(graph.count, without)) return plain;
	return Math.max(plain, inksFor(bound.inks, reserved));
}

function anyVertex(count: number, test: (v: number) => boolean): boolean {
	for (let v = 0; v < count; v++) if (test(v)) return true;
	return false;
}

/** The number of inks among which so many are not reserved. */
function inksFor(free: number, { inks }: ReservedInks): number {
	let most = free;
	for (const ink of inks) if (ink < most) most++;
	return most;
}
