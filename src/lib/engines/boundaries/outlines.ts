/**
 * Rings as runs of vertex numbers, not closed by a repeated first vertex, walked with their region on
 * the left; `ringRegion` says whose they are. This is what segments are indexed from.
 */
export interface Outlines {
	/** longitude and latitude of each vertex, interleaved */
	positions: Float64Array;
	vertices: number;
	ringVertices: Uint32Array;
	/** rings + 1 */
	ringStarts: Uint32Array;
	ringRegion: Uint32Array;
	regions: number;
}
