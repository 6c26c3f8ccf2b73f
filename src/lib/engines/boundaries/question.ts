import type { BoundaryOptions } from './options.ts';

/** One choice of a question: what it is called, what it means for the file, and the options that take it. */
export interface Choice {
	/** stands in the form; a layer's or a column's name, a system's code */
	value: string;
	/** a plain sentence on what this choice would give, such as where the file would lie */
	words: string;
	/** merged into the options when it is chosen */
	options: Pick<BoundaryOptions, 'layer' | 'crs' | 'axes' | 'duplicateKeys' | 'keyField'>;
	/** the file drawn as this choice would have it; null where it would look the same */
	sketch: Sketch | null;
}

/**
 * What a file does not say and nobody can know but its supplier. It goes with a refusal: answered, the
 * same bytes are read again with the options of the choice.
 */
export interface Question {
	about: 'layer' | 'crs' | 'axes' | 'keys';
	/** one sentence */
	message: string;
	choices: Choice[];
	/** whether an answer that is not among the choices can be typed (a reference system, a column) */
	free: boolean;
	/** the same for files that look alike (format, layers, columns), so that an answer can be remembered */
	likeness: string;
	/** what the file turned out to hold before the question arose */
	found: Found;
}

/** What the reader recognised in a file. */
export interface Found {
	format: string;
	layers: FoundLayer[];
	/** the layer that was read, null while that is the question or the format has none */
	layer: string | null;
	crs: string | null;
	encoding: string | null;
	features: number | null;
	/** columns with their first few values as text, in the file's order */
	columns: { name: string; examples: string[]; distinct: number; empty: number }[];
	keyField: string | null;
	nameField: string | null;
	/** the same for files that look alike */
	likeness: string;
	/** the file as it lies, in its own coordinates; null before any was read */
	sketch: Sketch | null;
}

export interface FoundLayer {
	name: string;
	features: number | null;
	/** whether it holds areas; null when that is not known without reading it */
	areas: boolean | null;
	/** as declared, or null */
	crs: string | null;
}

/** A rough drawing: polylines in the file's own coordinates, few enough points to travel in JSON. */
export interface Sketch {
	/** west, south, east, north (or least x, least y, greatest x, greatest y) */
	box: [number, number, number, number];
	/** x, y interleaved, closed rings; at most some 6,000 points together */
	lines: number[][];
	/** rings that were left out because they are too small to see */
	leftOut: number;
}
