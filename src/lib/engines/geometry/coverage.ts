/**
 * A coverage: regions cut from shared arcs, so that a border between two regions exists once.
 * Everything heavy is a flat typed array; positions are degrees of longitude and latitude
 * (WGS 84), interleaved. Regions, parts, rings and arcs are numbered from 0.
 *
 * Invariants (checked by `coverageFaults` and held by every coverage an engine returns):
 * - an arc has at least two points (a closed arc at least four, first equal to last);
 * - walking an arc forward, `arcLeft` is the region on the left and `arcRight` on the right, -1 for none;
 * - the arcs of a ring follow each other end to end and close;
 * - the first ring of a part is its outer ring, anticlockwise; the others are holes, clockwise.
 */
export interface Coverage {
	keys: string[];
	names: string[];
	/** longitude, latitude of every arc point in turn */
	arcPoints: Float64Array;
	/** arcs + 1: first point (not coordinate) of each arc */
	arcStarts: Uint32Array;
	arcLeft: Int32Array;
	arcRight: Int32Array;
	/** geodesic length of each arc on the WGS 84 ellipsoid */
	arcMetres: Float64Array;
	/** arcs of all rings in turn: i walked forward, ~i walked backward */
	ringArcs: Int32Array;
	/** rings + 1: first entry of each ring in `ringArcs` */
	ringStarts: Uint32Array;
	/** parts + 1: first ring of each part */
	partRings: Uint32Array;
	/** regions + 1: first part of each region */
	regionParts: Uint32Array;
	areasKm2: Float64Array;
	/** the one region that surrounds every part of this one, or -1 */
	enclaveOf: Int32Array;
}
