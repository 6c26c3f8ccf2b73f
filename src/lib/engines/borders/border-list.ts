/** How two regions meet; the number is the code in `BorderList.kind`. */
export const borderKinds = ['line', 'point', 'water', 'hand'] as const;
export type BorderKind = (typeof borderKinds)[number];

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
