import { kindCode, type BorderList } from './border-list.ts';

/**
 * The borders without the gaps that a sheet's rule does not reach: those may be measured at any time, by
 * anyone, and what is made of an edition must not change with it. In: borders as found, and the widest gap
 * that counts in kilometres, null where none was asked for. Out: the same borders in the same order.
 */
export function knownGaps(borders: BorderList, waterKm: number | null): BorderList {
	const reach = (waterKm ?? 0) * 1000;
	const { a, b, kind, metres, at } = borders;
	const kept = [...kind.keys()].filter((i) => kind[i] !== kindCode('gap') || metres[i] <= reach);
	if (kept.length === kind.length) return borders;
	return {
		a: Uint32Array.from(kept, (i) => a[i]),
		b: Uint32Array.from(kept, (i) => b[i]),
		kind: Uint8Array.from(kept, (i) => kind[i]),
		metres: Float64Array.from(kept, (i) => metres[i]),
		at: Float64Array.from(kept.flatMap((i) => [at[2 * i], at[2 * i + 1]])),
	};
}
