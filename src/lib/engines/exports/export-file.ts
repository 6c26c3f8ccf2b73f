import { exportCsv } from './csv.ts';
import { exportGeoJson } from './geojson.ts';
import {
	exportKind,
	plainOptions,
	quantumLimits,
	type ExportKindId,
	type ExportOptions,
	type SingleKindId,
} from './kinds.ts';
import { lackingLetters } from './letters/lacking.ts';
import { packFiles } from './package.ts';
import { exportPdf } from './pdf/pdf.ts';
import { exportPng, pixelsOf } from './png/png.ts';
import { exportSld } from './sld/sld.ts';
import type { ExportedFile, ExportOutcome, ExportSource, ExportTools } from './source.ts';
import { exportSvg, packSvg } from './svg.ts';
import { exportCss } from './swatches/css.ts';
import { exportTokens } from './swatches/tokens.ts';
import { sheetTables } from './tables/sheet-tables.ts';
import { exportTopoJson } from './topojson/topojson.ts';
import { exportWorkbook } from './workbook.ts';

type Refused = Extract<ExportOutcome, { status: 'refused' }>;
type Made = Uint8Array | Refused;
type Writer<K extends ExportKindId> = (
	source: ExportSource,
	options: ExportOptions[K],
	tools: ExportTools,
) => Made | Promise<Made>;

const svgOf: Writer<'svg'> = ({ drawing, fonts, about }, options) =>
	exportSvg(drawing, { ...options, fonts, language: about.language });

const writers: { [K in SingleKindId]: Writer<K> } = {
	pdf: exportPdf,
	svg: svgOf,
	svgz: async (source, options, tools) =>
		packSvg((await svgOf(source, options, tools)) as Uint8Array),
	png: (source, options, { rasterise }) => {
		const pixels = pixelsOf(source.drawing, options.dpi);
		if (pixels.status === 'refused') return pixels;
		if (!rasterise) throw new TypeError('a picture needs the tool that paints pixels');
		return exportPng(source, options, pixels.width, rasterise);
	},
	geojson: ({ coverage, rows, columns }) => exportGeoJson(coverage, rows, columns),
	topojson: ({ coverage, rows, columns }, { steps }) => {
		const { least, greatest } = quantumLimits;
		if (Number.isInteger(steps) && steps >= least && steps <= greatest) {
			return exportTopoJson(coverage, rows, columns, steps);
		}
		const message = `Steps are a whole number from ${least} to ${greatest}.`;
		return { status: 'refused', reason: 'bad-option', message };
	},
	csv: ({ rows, columns }, options) => exportCsv(rows, options, columns),
	xlsx: (source) => exportWorkbook(sheetTables(source)),
	sld: ({ drawing, about }) => exportSld(drawing, about),
	tokens: ({ drawing, about }) => exportTokens(drawing.inks, about),
	css: ({ drawing, about }) => exportCss(drawing.inks, about),
};

/** Kinds that show the sheet's letters with the product's own faces. */
const lettered: ReadonlySet<ExportKindId> = new Set(['pdf', 'png', 'svg', 'svgz']);

/**
 * A sheet as one file of a kind. In: the source, options that may be partial (`plainOptions` gives the
 * rest), and tools for what an engine cannot do (a PNG needs `rasterise`). Out: the file, the same bytes
 * for the same input, or why there is none. Throws where a tool is missing, a programmer's error.
 */
export async function exportFile<K extends ExportKindId>(
	id: K,
	source: ExportSource,
	options: Partial<ExportOptions[K]> = {},
	tools: ExportTools = {},
): Promise<ExportOutcome> {
	const asked = { ...plainOptions[id], ...options };
	const made =
		id === 'zip'
			? await packageOf(source, asked as ExportOptions['zip'], tools)
			: await (writers[id as SingleKindId] as Writer<K>)(source, asked, tools);
	if ('status' in made) return made;
	const { extension, mediaType } = exportKind(id);
	const name = `${source.about.stem}.${extension}`;
	const notes = lettered.has(id) ? lackingLetters(source.drawing) : [];
	return { status: 'made', file: { name, mediaType, bytes: made, notes } };
}

async function packageOf(
	source: ExportSource,
	{ kinds, options }: ExportOptions['zip'],
	tools: ExportTools,
): Promise<Made> {
	const files: ExportedFile[] = [];
	const wanted = [...new Set(kinds)];
	if (!wanted.length) {
		const message = 'Choose at least one kind of file for the package.';
		return { status: 'refused', reason: 'bad-option', message };
	}
	for (const [place, id] of wanted.entries()) {
		tools.progress?.(`Writing ${exportKind(id).words}`, place / wanted.length);
		const outcome = await exportFile(id, source, options[id] ?? {}, tools);
		if (outcome.status === 'refused') return outcome;
		files.push(outcome.file);
	}
	return packFiles(files, source.about);
}
