import type { Mend } from './mend.ts';
import type { Bench, Outcome } from './step.ts';
import { settle, untangle } from './step-cuts.ts';
import { fill, part } from './step-places.ts';
import { drop, merge } from './step-regions.ts';

/** Applies one step to the draft, or says why not; then the draft is as it was. */
export function applyMend(mend: Mend, bench: Bench): Outcome {
	switch (mend.kind) {
		case 'fill':
			return fill(mend, bench);
		case 'settle':
			return settle(mend, bench);
		case 'drop':
			return drop(mend, bench);
		case 'merge':
			return merge(mend, bench);
		case 'untangle':
			return untangle(mend, bench);
		case 'part':
			return part(mend, bench);
	}
}

/** A step as the beginning of a sentence that says it was not applied. */
export function mendWords(mend: Mend): string {
	switch (mend.kind) {
		case 'fill':
			return `Giving the land at ${placeText(mend.at)} to ${mend.into}`;
		case 'settle':
			return `Leaving what ${mend.a} and ${mend.b} both cover with ${mend.keep}`;
		case 'drop':
			return `Leaving out ${mend.key}`;
		case 'merge':
			return `Joining ${mend.key} into ${mend.into}`;
		case 'untangle':
			return `Cutting the outline of ${mend.key} where it crosses itself`;
		case 'part': {
			const where = `the part of ${mend.key} at ${placeText(mend.at)}`;
			return mend.into === null ? `Leaving out ${where}` : `Giving ${where} to ${mend.into}`;
		}
	}
}

/** Keys that a step speaks of. */
export function mendKeys(mend: Mend): string[] {
	switch (mend.kind) {
		case 'fill':
			return [mend.into];
		case 'settle':
			return [mend.a, mend.b];
		case 'merge':
			return [mend.key, mend.into];
		case 'part':
			return mend.into === null ? [mend.key] : [mend.key, mend.into];
		default:
			return [mend.key];
	}
}

const placeText = ([lon, lat]: [number, number]) =>
	`longitude ${lon.toFixed(5)}, latitude ${lat.toFixed(5)}`;
