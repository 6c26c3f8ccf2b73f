import PDFDocument from 'pdfkit';
import { cleanText } from '../../sheet/type/clean-text.ts';
import type { Drawing } from '../../sheet/index.ts';
import { escapeXml } from '../../sheet/svg/escape.ts';
import type { ExportAbout } from '../source.ts';
import { pointsPerUnit } from './numbers.ts';

const maker = 'Merestone';
const encoder = new TextEncoder();

/** What the package has and its types do not tell. */
interface Inside {
	_root: { data: Record<string, unknown> };
	ref(data: Record<string, unknown>): PdfReference;
	page: { resources: { data: Record<string, unknown> }; write(bytes: Uint8Array): void };
}

export interface PdfReference {
	data: Record<string, unknown>;
	end(): void;
}

/**
 * A document of one page, exact in size, with fixed times, so that the same sheet gives the same bytes.
 * The metadata (XMP, ISO 16684-1) are written here, because the package puts texts into their XML as
 * they are.
 */
export class SheetDocument extends PDFDocument {
	readonly #about: { title: string; author: string; subject: string; date: string };

	constructor({ widthMm, heightMm, description }: Drawing, about: ExportAbout) {
		const title = cleanText(about.title) || maker;
		const [author, subject] = [
			cleanText(about.author),
			cleanText(`${about.issue}. ${description}`),
		];
		const keywords = about.digest ? { Keywords: `content digest ${about.digest}` } : {};
		super({
			size: [widthMm * 100 * pointsPerUnit, heightMm * 100 * pointsPerUnit],
			margin: 0,
			font: '',
			pdfVersion: '1.7',
			tagged: true,
			displayTitle: true,
			lang: about.language,
			info: {
				...{ Title: title, Author: author, Subject: subject, ...keywords },
				...{ Producer: maker, Creator: maker, CreationDate: new Date(about.date) },
			},
		});
		this.#about = { title, author, subject, date: new Date(about.date).toISOString() };
	}

	/** Called by the package when it ends the document, in place of its own. */
	_addInfo(): void {
		const { title, author, subject, date } = this.#about;
		const text = (value: string) => escapeXml(value);
		this.appendXML(`<rdf:Description rdf:about="" xmlns:xmp="http://ns.adobe.com/xap/1.0/">
<xmp:CreateDate>${date.slice(0, 19)}Z</xmp:CreateDate><xmp:CreatorTool>${maker}</xmp:CreatorTool>
</rdf:Description>
<rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/">
<dc:title><rdf:Alt><rdf:li xml:lang="x-default">${text(title)}</rdf:li></rdf:Alt></dc:title>
<dc:creator><rdf:Seq><rdf:li>${text(author)}</rdf:li></rdf:Seq></dc:creator>
<dc:description><rdf:Alt><rdf:li xml:lang="x-default">${text(subject)}</rdf:li></rdf:Alt></dc:description>
</rdf:Description>
<rdf:Description rdf:about="" xmlns:pdf="http://ns.adobe.com/pdf/1.3/"><pdf:Producer>${maker}</pdf:Producer></rdf:Description>`);
	}

	/** Operators on the page: as bytes, because the package turns text into them letter by letter. */
	operators(text: string): void {
		this.#inside.page.write(encoder.encode(`${text}\n`));
	}

	/** A dictionary among the document's objects; `end` it once it is whole. */
	dictionary(data: Record<string, unknown>): PdfReference {
		return this.#inside.ref(data);
	}

	/** An entry of the catalogue (ISO 32000-1, 7.7.2). */
	catalogue(name: string, value: unknown): void {
		this.#inside._root.data[name] = value;
	}

	/** An entry of the page's resources (ISO 32000-1, 7.8.3). */
	resource(name: string, value: unknown): void {
		this.#inside.page.resources.data[name] = value;
	}

	/** Ends the document and gives its bytes. */
	bytes(): Promise<Uint8Array> {
		const parts: Uint8Array[] = [];
		return new Promise((done, failed) => {
			this.on('data', (part: Uint8Array) => parts.push(part));
			this.on('error', failed);
			this.on('end', () => done(joined(parts)));
			this.end();
		});
	}

	get #inside(): Inside {
		return this as unknown as Inside;
	}
}

function joined(parts: Uint8Array[]): Uint8Array {
	const bytes = new Uint8Array(parts.reduce((sum, { length }) => sum + length, 0));
	let at = 0;
	for (const part of parts) {
		bytes.set(part, at);
		at += part.length;
	}
	return bytes;
}
