import type { Mend } from './mends/mend.ts';

/** Bytes in turn, written into the memory given. */
export interface ByteReader {
	/** how many were written, from its start; none only at the end */
	read(memory: Uint8Array): Promise<number>;
	close(): Promise<void>;
}

/** Bytes to read, from a file on disk, a browser's file or memory. */
export interface ByteSource {
	name: string;
	/** bytes */
	size: number;
	/** may be called again, and then starts from the first byte again */
	chunks(): AsyncIterable<Uint8Array>;
	/** the same bytes for who brings memory for them; new memory for each chunk takes longer than reading it */
	reader?(): ByteReader;
}

export interface BoundaryOptions {
	/** which layer of a file with several */
	layer?: string;
	/** the column whose values are the keys, or `id` for the feature's own id */
	keyField?: string;
	nameField?: string;
	/** `EPSG:n`, a WKT or a PROJ string; goes before what the file says */
	crs?: string;
	/** order of the two numbers of a geographic position; longitude first unless given */
	axes?: 'lonlat' | 'latlon';
	/** unmatched borders within this distance are joined; 0.02 m unless given */
	toleranceMetres?: number;
	/** pairs across water (or any gap) up to this width are borders; none unless given */
	acrossWaterKm?: number;
	duplicateKeys?: 'refuse' | 'merge' | 'rename';
	/** replayed in this order once the regions are named */
	mends?: Mend[];
	limits?: Partial<Limits>;
}

export interface Limits {
	/** bytes of all files of an archive together, unpacked */
	unpackedBytes: number;
	/** bytes of a file that must be held whole (TopoJSON, an archive) */
	wholeBytes: number;
	/** how deep JSON may nest */
	nesting: number;
	regions: number;
	points: number;
}

export const defaultLimits: Limits = {
	unpackedBytes: 2 * 1024 ** 3,
	wholeBytes: 1024 ** 3,
	nesting: 64,
	regions: 1_000_000,
	points: 60_000_000,
};

/** Told what is being done and how far it is (0 to 1); asked whether to stop. */
export interface Watch {
	progress?(message: string, share: number): void;
	cancelled?(): boolean;
}

/** Joins the noise of decimal places and the vertices that lie on another region's edge. */
export const noiseMetres = 0.02;
