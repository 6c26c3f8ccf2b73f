import type { GoalKind } from './goal-wish.ts';

/** One goal as a number that is to be made small, kept up to date turn by turn of Kempe chains. */
export interface Aim {
	readonly kind: GoalKind;
	/** what the board comes to now */
	readonly value: number;
	/** no colouring that keeps the rules is below */
	readonly bound: number;
	/** nobody could tell a value at or under this from the bound */
	readonly enough: number;
	/** how many scales, each 64 times finer than the one before, the value is made of */
	readonly scales: number;
	/** whether going straight down is tried before any heat */
	readonly descends: boolean;
	/** Reads the whole board afresh. */
	read(): void;
	/** The value once this chain of inks c and d is turned over; the board is not touched. */
	after(chain: Uint32Array, c: number, d: number): number;
	/** The turn weighed last is made. */
	keep(): void;
	/** The turn weighed last is not made. */
	forget(): void;
}
