import type { Mend } from '$lib/engines/boundaries/mends/mend';

/** One mend in force, in a sentence; `name` tells what a region of this key is called. */
export function mendWords(mend: Mend, name: (key: string) => string): string {
	switch (mend.kind) {
		case 'fill':
			return `The hole at ${place(mend.at)} belongs to ${name(mend.into)}.`;
		case 'settle':
			return `What ${name(mend.a)} and ${name(mend.b)} both covered stays with ${name(mend.keep)}.`;
		case 'drop':
			return `${name(mend.key)} is left out.`;
		case 'merge':
			return `${name(mend.key)} is part of ${name(mend.into)}.`;
		case 'untangle':
			return `The outline of ${name(mend.key)} is cut where it crossed itself.`;
		case 'part':
			return mend.into === null
				? `The part of ${name(mend.key)} at ${place(mend.at)} is left out.`
				: `The part of ${name(mend.key)} at ${place(mend.at)} belongs to ${name(mend.into)}.`;
	}
}

const place = ([lon, lat]: [number, number]) =>
	`longitude ${lon.toFixed(4)}, latitude ${lat.toFixed(4)}`;
