import type { Coverage } from '../boundaries/coverage.ts';
import type { Drawing, SheetRow } from '../sheet/index.ts';
import type { BordersOut } from './borders.ts';
import type { FaceFiles } from './svg.ts';

/** All that a file is made from. The same source and options give the same bytes. */
export interface ExportSource {
	drawing: Drawing;
	/** full geometry */
	coverage: Coverage;
	/** `sheetTable` of the drawing, in region order */
	rows: SheetRow[];
	/** more columns beside those of `rows`: territories, classes of a theme */
	columns: ExtraColumn[];
	/** listed in the workbook; null leaves that worksheet out */
	borders: BordersOut | null;
	about: ExportAbout;
	/** whole TrueType files of the faces that the sheet uses */
	fonts: FaceFiles;
}

/** One value a region, in region order. */
export interface ExtraColumn {
	/** name of the property in GeoJSON and TopoJSON: letters and digits */
	id: string;
	/** in tables */
	heading: string;
	unit?: string;
	kind: 'text' | 'number';
	values: (string | number | null)[];
}

/** What the tables of a sheet tell beside what is drawn on it, a value a region in region order. */
export interface FurtherValues {
	/** null: the sheet has no territories */
	territories: readonly ({ key: string; name: string } | null)[] | null;
	/** of a theme whose figures files may carry, suppressed ones left out; null: no figures */
	figures: { title: string; values: readonly (number | null)[] } | null;
}

export interface ExportAbout {
	/** title of the sheet */
	title: string;
	/** `Edition 4, 1 December 2026`, or what draft it is */
	issue: string;
	/** when it was issued, or the draft saved: ISO 8601 in UTC; the clock is never asked */
	date: string;
	/** the team */
	author: string;
	/** digest of the edition's content, hex; null for a draft */
	digest: string | null;
	/** whose boundaries they are */
	credits: string;
	/** beginning of the names of files, safe for any file system */
	stem: string;
	/** language of the sheet, BCP 47 */
	language: string;
}

/** What an engine cannot do by itself and is handed: painting an SVG in pixels. */
export interface ExportTools {
	/** In: an SVG without fonts, its width in pixels, and `#rrggbb` or null under it. Out: a PNG. */
	rasterise?: (svg: Uint8Array, width: number, ground: string | null) => Promise<Uint8Array>;
	/** Told before each file of a package, with the share done, 0 to 1. */
	progress?: (step: string, share: number) => void;
}

export interface ExportedFile {
	/** `stem` and extension */
	name: string;
	mediaType: string;
	bytes: Uint8Array;
	/** what whoever takes the file should know, in sentences: letters that no face has, and the like */
	notes: string[];
}

export type ExportOutcome =
	| { status: 'made'; file: ExportedFile }
	| { status: 'refused'; reason: 'bad-option' | 'too-many-pixels'; message: string };
