import { gzipSync } from 'node:zlib';
import { decodeCoverage } from '../../engines/boundaries/index.ts';
import { bordersForSheet, type BorderList } from '../../engines/borders/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import {
	exportCsv,
	exportGeoJson,
	exportSvg,
	furtherColumns,
	type FurtherValues,
} from '../../engines/exports/index.ts';
import type { Reader } from '../../engines/palettes/index.ts';
import {
	doubledBorders,
	drawSheet,
	sheetTable,
	type SheetInput,
	type SheetTheme,
} from '../../engines/sheet/index.ts';
import { faceFiles } from './faces.ts';
import { sheetLanguage } from './sheet-language.ts';
import type { Task } from './task-port.ts';

export interface PaintInput {
	/** the coverage as stored */
	geometry: Uint8Array;
	/** as found; those that bind are picked by the draft's rules */
	borders: BorderList;
	draft: Draft;
	groups: (string | null)[];
	/** names as a column has them, where the layout takes them from one */
	named?: (string | null)[] | null;
	/** ink of each region; null while nothing is coloured */
	colouring: number[] | null;
	/** the classes of a measure, shown in place of it; null for none */
	theme: SheetTheme | null;
	reader: Reader;
	/** what is issued and when, in words */
	issue: string;
}

/** A region whose ink the palette lacks is drawn as not coloured. */
export function drawInput(input: PaintInput, how: Pick<SheetInput, 'bare'> = {}) {
	const coverage = decodeCoverage(input.geometry);
	const { draft, groups, named, reader, issue, theme } = input;
	const { layout } = draft;
	const { inks } = draft.palette;
	const borders = bordersForSheet(coverage.keys, input.borders, draft);
	const locked = Uint8Array.from(coverage.keys, (key) => (Object.hasOwn(draft.locks, key) ? 1 : 0));
	const colouring =
		input.colouring && Int32Array.from(input.colouring, (ink) => (ink < inks.length ? ink : -1));
	const weak = doubledBorders({ coverage, borders, colouring, inks, layout });
	const drawing = drawSheet({
		...{ coverage, borders, groups, named, inks, layout, reader, issue },
		...{ colouring, theme, locked, weak, ...how },
	});
	return { coverage, drawing };
}

/** Draws and paints a sheet as an SVG file, packed for its way. */
export function paintSheet({ input }: Task<PaintInput>): { gzip: Uint8Array } {
	return { gzip: gzipSync(exportSvg(drawInput(input).drawing, { fonts: faceFiles() })) };
}

export interface SheetFile {
	extension: 'svg' | 'geojson' | 'csv';
	mediaType: string;
	bytes: Uint8Array;
}

export interface FilesInput extends PaintInput {
	/** what tables tell beside what is drawn */
	further: FurtherValues;
}

/** Every file an edition is issued as, all from one drawing. */
export function renderFiles({ input }: Task<FilesInput>): SheetFile[] {
	const { coverage, drawing } = drawInput(input);
	const rows = sheetTable(drawing, coverage, input.groups);
	const columns = furtherColumns(rows, input.further);
	return [
		{
			extension: 'svg',
			mediaType: 'image/svg+xml',
			bytes: exportSvg(drawing, { fonts: faceFiles(), language: sheetLanguage }),
		},
		{
			extension: 'geojson',
			mediaType: 'application/geo+json',
			bytes: exportGeoJson(coverage, rows, columns),
		},
		{
			extension: 'csv',
			mediaType: 'text/csv; charset=utf-8',
			bytes: exportCsv(rows, { byteOrderMark: true }, columns),
		},
	];
}
