import type { MarkKind } from '$lib/components/Mark.svelte';
import { readers, type Reader } from '$lib/engines/palettes/palette';
import type { RampVerdict } from '$lib/engines/palettes/ramp-verdict';
import type { PaletteJudgement } from './palette-judgement';

export interface ClassVerdict {
	kind: MarkKind;
	/** who could take the class for another, in the order of `readers` */
	readers: Reader[];
}

/**
 * What the strip says of a class: who could take it for some other class of the legend, or for what it touches
 * on this sheet at the printed size, whichever is worse. Clear where nobody could.
 */
export function classVerdict(
	one: number,
	ramp: Pick<RampVerdict, 'byClass'> | null,
	sheet: Pick<PaletteJudgement, 'byInk'> | null,
): ClassVerdict {
	const found = [ramp?.byClass[one], sheet?.byInk[one]].flatMap((verdict) =>
		verdict?.readers.length ? [verdict] : [],
	);
	const close = new Set(found.flatMap((verdict) => verdict.readers));
	const bad = found.some(({ severity }) => severity === 'error');
	return {
		kind: bad ? 'error' : found.length ? 'warning' : 'clear',
		readers: readers.filter((reader) => close.has(reader)),
	};
}
