/**
 * How two regions meet; the number is the code in `BorderList.kind`. `water` is a pair across water that
 * was asked for when the file was read, `gap` one that was measured later and counts only where a
 * sheet's rule says how wide.
 */
export const borderKinds = ['line', 'point', 'water', 'hand', 'gap'] as const;
export type BorderKind = (typeof borderKinds)[number];

export const kindCode = (kind: BorderKind): number => borderKinds.indexOf(kind);

/** Whether a code of `BorderList.kind` is a pair with water, or open land, between. */
export const isAcross = (code: number): boolean =>
	code === kindCode('water') || code === kindCode('gap');

/**
 * Who touches whom: one entry a pair, `a < b` by region number, sorted by a then b.
 * A pair with a line is never listed as a point too.
 */
export interface BorderList {
	a: Uint32Array;
	b: Uint32Array;
	/** index into `borderKinds` */
	kind: Uint8Array;
	/** length of the shared line; 0 for a point touch; width of the gap across water */
	metres: Float64Array;
	/** a place on the border, longitude and latitude interleaved, for marks on the sheet */
	at: Float64Array;
}
