import type { MendOffer } from './mends/mend.ts';

/**
 * Something noted about a boundary file, with its place where there is one.
 * `code` is stable and machine-readable (see the API description); `message` is a plain sentence.
 */
export interface Finding {
	code: string;
	severity: 'error' | 'warning' | 'note';
	message: string;
	/** keys of the regions concerned; empty when the finding is about the whole file */
	regions: string[];
	/** longitude and latitude in degrees, or null */
	at: [number, number] | null;
	/** ways to mend it; absent where there is none */
	offers?: MendOffer[];
	/** the tolerance in metres that would join the borders it is about */
	toleranceMetres?: number;
}
