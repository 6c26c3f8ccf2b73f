import { SaxesParser } from 'saxes';
import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Cancelled, Refusal } from '../refusal.ts';
import { decoded, WrongEncoding } from './decoded.ts';
import { KmlFeatures } from './kml-features.ts';
import { firstBytes } from './whole.ts';
import { xmlEncoding } from './xml-start.ts';

type Options = BoundaryOptions & { limits: Limits };

/**
 * KML 2.2 (OGC 07-147r2): one region a Placemark, in the order of the document, longitude first on
 * WGS 84. Columns: `name`, the values of ExtendedData, `folder` (the names of the folders around it) and
 * `description`. Links are not followed; a file that declares a document type or entities is refused, and
 * so is one that is not well-formed.
 */
export async function readKml(
	source: ByteSource,
	{ limits }: Options,
	watch: Watch,
): Promise<RawLayer> {
	const encoding = xmlEncoding(await firstBytes(source));
	const layer = new RawLayer(limits);
	layer.format = 'KML';
	layer.encoding = encoding === 'utf-8' ? 'UTF-8' : encoding;
	layer.crsByFormat = 'EPSG:4326';
	const features = new KmlFeatures(layer, limits.nesting);
	const parser = parserInto(features);
	let silent = 0;
	try {
		for await (const piece of decoded(source, encoding)) {
			if (watch.cancelled?.()) throw new Cancelled();
			watch.progress?.(`Reading features (${layer.regions} so far)`, 0);
			const before = features.taken;
			parser.write(piece);
			silent = features.taken === before ? silent + piece.length : 0;
			if (silent > mostCharacters) throw tooLong(features);
		}
	} catch (error) {
		if (!(error instanceof WrongEncoding)) throw error;
		throw new Refusal('file-damaged', `The file is not in ${encoding}, as it says.`);
	}
	parser.on('error', () => {
		throw new Refusal('file-truncated', `The file ends inside ${features.place()}; it is cut off.`);
	});
	parser.close();
	features.end();
	return layer;
}

const mostAttributes = 100;
/** of one text or tag */
const mostCharacters = 48 * 1024 * 1024;

function tooLong(features: KmlFeatures): Refusal {
	const message = `A text of the file is longer than ${mostCharacters} characters (${features.place()}).`;
	return new Refusal('too-large-unpacked', message);
}

function parserInto(features: KmlFeatures): SaxesParser {
	const parser = new SaxesParser();
	let attributes = 0;
	parser.on('opentagstart', () => (attributes = 0));
	parser.on('attribute', () => {
		if (++attributes <= mostAttributes) return;
		const message = `An element has more than ${mostAttributes} attributes (${features.place()}).`;
		throw new Refusal('file-damaged', message);
	});
	parser.on('opentag', ({ name, attributes }) => features.open(local(name), attributes));
	parser.on('closetag', ({ name }) => features.close(local(name)));
	parser.on('text', (text) => features.text(text));
	parser.on('cdata', (text) => features.text(text));
	parser.on('doctype', () => {
		const message =
			'The file declares a document type, by which it could refer to others. Remove it.';
		throw new Refusal('unsupported-format', message);
	});
	parser.on('error', ({ message }) => {
		const said = message.replace(/^\d+:\d+: /, '').replace(/\.$/, '');
		const place = `line ${parser.line}, ${features.place()}`;
		throw new Refusal('file-damaged', `The file is not well-formed XML: ${said} (${place}).`);
	});
	return parser;
}

const local = (name: string): string => name.slice(name.indexOf(':') + 1);
