import { borderKinds } from '../engines/borders/border-list.ts';
import type { SheetBorderRow } from '../engines/borders/sheet-rows.ts';
import { kindWords } from './border-words';

/** Which borders are asked for. */
export interface BorderQuestion {
	/** words of `kindWords`, or `any` */
	kind: string;
	standing: 'any' | 'counts' | 'not' | 'hand';
	/** key of a region at either end, or part of its name */
	region: string;
	/** metres of the shared line or of the gap */
	least: number | null;
	most: number | null;
}

/** Answers for each row whether it is asked for. */
export function borderRowFilter(
	{ kind, standing, region, least, most }: BorderQuestion,
	keys: readonly string[],
	nameOf: (region: number) => string,
): (row: SheetBorderRow) => boolean {
	const here = region.trim() ? regionsLike(region.trim(), keys, nameOf) : null;
	return (row) =>
		(kind === 'any' || kindWords[borderKinds[row.kind]] === kind) &&
		isStanding(row, standing) &&
		(here === null || here[row.a] === 1 || here[row.b] === 1) &&
		(least === null || row.metres >= least) &&
		(most === null || row.metres <= most);
}

function isStanding({ standing, hand }: SheetBorderRow, asked: BorderQuestion['standing']) {
	if (asked === 'any') return true;
	if (asked === 'hand') return hand !== null;
	return (standing === 'counts') === (asked === 'counts');
}

/** 1 for the region with this key; where no key is so, for those whose name has the words in it. */
function regionsLike(
	text: string,
	keys: readonly string[],
	nameOf: (region: number) => string,
): Uint8Array {
	const here = new Uint8Array(keys.length);
	const exact = keys.indexOf(text);
	if (exact >= 0) {
		here[exact] = 1;
		return here;
	}
	const wanted = text.toLocaleLowerCase();
	keys.forEach((_, region) => {
		if (nameOf(region).toLocaleLowerCase().includes(wanted)) here[region] = 1;
	});
	return here;
}
