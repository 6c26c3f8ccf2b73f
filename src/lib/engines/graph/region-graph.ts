/**
 * An undirected simple graph in compressed rows: the neighbours of vertex v are
 * `targets[offsets[v]] .. targets[offsets[v + 1] - 1]`, ascending, without loops or doubles.
 */
export interface RegionGraph {
	count: number;
	/** count + 1 */
	offsets: Uint32Array;
	/** twice the number of edges */
	targets: Uint32Array;
}
