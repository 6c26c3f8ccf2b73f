import type { Wishes } from './search-energy.ts';

/** How an annealing goes; weights are in moves of mean cost. */
export interface AnnealSettings extends Wishes {
	proposals: number;
	seed: number;
	/** temperature at the start and at the end */
	hot: number;
	cold: number;
	/** penalty for a mean unit outside tolerance, at the start and at the end */
	loose: number;
	strict: number;
	/** penalty at the end for being outside tolerance at all, however little */
	step: number;
	/** weight of the quadratic term at the start; it fades to `spreadEnd` */
	spread: number;
	/** share of proposals that are chains of two steps, of 65,536 */
	chains: number;
	/** territories that take part; all others stay as they are */
	territories: Int32Array;
	/** true ends the run */
	cancelled?: () => boolean;
	progress?: (share: number) => void;
}
