/** What a sheet or an edition can leave the house as, and what may be asked of each kind. */
export interface ExportKind {
	id: ExportKindId;
	/** without the dot */
	extension: string;
	mediaType: string;
	/** its name in the interface */
	words: string;
	/** what it is good for, in a sentence */
	use: string;
}

/** Options by kind; every field has its default in `plainOptions`. */
export interface ExportOptions {
	svg: SvgFileOptions;
	svgz: SvgFileOptions;
	pdf: {
		/** layers that can be switched off in a viewer: fills, hatches, borders by rank, names, collar */
		layers: boolean;
	};
	png: {
		/** pixels an inch, whole, within `dpiLimits` */
		dpi: number;
		ground: 'white' | 'none';
	};
	geojson: Record<never, never>;
	topojson: {
		/** steps along the longer side of the extent, within `quantumLimits` */
		steps: number;
	};
	csv: {
		/** helps spreadsheets that would otherwise misread accents */
		byteOrderMark: boolean;
	};
	xlsx: Record<never, never>;
	sld: Record<never, never>;
	tokens: Record<never, never>;
	css: Record<never, never>;
	zip: {
		kinds: SingleKindId[];
		options: Partial<Omit<ExportOptions, 'zip'>>;
	};
}

export interface SvgFileOptions {
	/** a style block with a class for each ink, or an attribute on every region */
	colours: 'class' | 'attribute';
	/** carried inside the file, drawn as paths, or left to the reader's machine */
	letters: 'embedded' | 'outlines' | 'plain';
}

export type ExportKindId = keyof ExportOptions;
/** every kind but the package of others */
export type SingleKindId = Exclude<ExportKindId, 'zip'>;

export const dpiLimits = { least: 72, greatest: 600 };
/** pixels of one picture: about 330 MB while it is painted, and A2 at 300 dpi fits */
export const pixelLimit = 80_000_000;
export const quantumLimits = { least: 1_000, greatest: 100_000_000 };

export const plainOptions: ExportOptions = {
	svg: { colours: 'class', letters: 'embedded' },
	svgz: { colours: 'class', letters: 'embedded' },
	pdf: { layers: true },
	png: { dpi: 300, ground: 'white' },
	geojson: {},
	topojson: { steps: 10_000_000 },
	csv: { byteOrderMark: true },
	xlsx: {},
	sld: {},
	tokens: {},
	css: {},
	zip: { kinds: ['pdf', 'svg', 'geojson', 'csv', 'tokens'], options: {} },
};

const kind = (
	id: ExportKindId,
	extension: string,
	mediaType: string,
	words: string,
	use: string,
): ExportKind => ({ id, extension, mediaType, words, use });

/** In the order in which they are offered. */
export const exportKinds: readonly ExportKind[] = [
	kind(
		'pdf',
		'pdf',
		'application/pdf',
		'PDF',
		'To print, exact to the millimetre, with its letters.',
	),
	kind('svg', 'svg', 'image/svg+xml', 'SVG', 'To go on drawing: named layers, one shape a region.'),
	kind('svgz', 'svgz', 'image/svg+xml', 'SVG, packed', 'The same, a quarter of the size.'),
	kind('png', 'png', 'image/png', 'PNG', 'A picture for slides and pages.'),
	kind(
		'geojson',
		'geojson',
		'application/geo+json',
		'GeoJSON',
		'Boundaries with their inks, as areas.',
	),
	kind('topojson', 'topojson', 'application/json', 'TopoJSON', 'The same, each border once.'),
	kind('csv', 'csv', 'text/csv; charset=utf-8', 'CSV', 'A line for each region.'),
	kind(
		'xlsx',
		'xlsx',
		'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
		'XLSX',
		'The tables as one workbook: regions, inks and borders.',
	),
	kind(
		'sld',
		'sld',
		'application/vnd.ogc.sld+xml',
		'SLD 1.1',
		'Styles for a map server, a rule for each ink.',
	),
	kind(
		'tokens',
		'tokens.json',
		'application/design-tokens+json',
		'Design Tokens',
		'The inks for design programs.',
	),
	kind('css', 'css', 'text/css; charset=utf-8', 'CSS', 'The inks as custom properties.'),
	kind(
		'zip',
		'zip',
		'application/zip',
		'Package',
		'Several of these, with a list of their digests.',
	),
];

export const exportKind = (id: ExportKindId): ExportKind =>
	exportKinds.find((one) => one.id === id)!;
