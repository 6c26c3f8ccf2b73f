import { mayTake, newBoard, setInk, type Board } from './board.ts';
import type { Prepared } from './prepare.ts';

/**
 * The board of a colouring by region.
 * @throws RangeError when it is not proper: a region without ink, a border, lock or rule broken
 */
export function properBoard(prepared: Prepared, colouring: ArrayLike<number>, inks: number): Board {
	const { graph, vertexOf, fixed, bans } = prepared;
	if (prepared.clash || prepared.inksLocked > inks) throw new RangeError('The rules collide.');
	if (colouring.length !== vertexOf.length)
		throw new RangeError('An ink is needed for each region.');
	const board = newBoard(graph, inks, fixed, bans);
	for (let r = 0; r < vertexOf.length; r++) {
		const v = vertexOf[r];
		const ink = colouring[r];
		const fits = Number.isInteger(ink) && ink >= 0 && ink < inks && mayTake(board, v, ink);
		if (!fits) throw new RangeError(`Region ${r} cannot have ink ${ink}.`);
		if (board.ink[v] >= 0 && board.ink[v] !== ink) throw new RangeError(`Region ${r} differs.`);
		setInk(board, v, ink);
	}
	for (let v = 0; v < graph.count; v++) {
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			if (board.ink[graph.targets[e]] === board.ink[v]) {
				throw new RangeError('Regions that must differ share an ink.');
			}
		}
	}
	return board;
}
