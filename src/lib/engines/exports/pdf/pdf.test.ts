import fc from 'fast-check';
import { SaxesParser } from 'saxes';
import { describe, expect, it } from 'vitest';
import { fonts, hostileSource, sourceOf } from '../../../../../tests/support/export-source.ts';
import {
	pdfFonts,
	pdfImages,
	pdfInfo,
	pdfMetadata,
	pdfStructure,
	pdfText,
} from '../../../../../tests/support/poppler.ts';
import { layout, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { cleanText } from '../../sheet/type/clean-text.ts';
import { exportPdf } from './pdf.ts';

const all = { layers: true };
const latin1 = (bytes: Uint8Array) => Buffer.from(bytes).toString('latin1');

describe('PDF, as poppler-utils read it', () => {
	it('has one page, exact in size, and says what it is', async () => {
		const source = sourceOf();
		const info = pdfInfo(await exportPdf(source, all));
		expect(info).toMatchObject({
			...{ Title: source.about.title, Author: 'Corran Pumps', Producer: 'Merestone' },
			...{ Pages: '1', Tagged: 'yes', 'PDF version': '1.7', JavaScript: 'no' },
		});
		expect(info.Subject).toContain(source.drawing.description);
		// ISO 216: A4 is 210 by 297 mm, and ISO 32000-1: a point is 25.4 / 72 mm
		const [width, height] = [...info['Page size'].matchAll(/[\d.]+/g)].map(Number);
		expect(width).toBeCloseTo((297 / 25.4) * 72, 2);
		expect(height).toBeCloseTo((210 / 25.4) * 72, 2);
	});

	it('carries every face as a subset with its characters, and no picture', async () => {
		const { drawing, about } = sourceOf();
		const pdf = await exportPdf({ drawing, about, fonts }, all);
		const found = pdfFonts(pdf);
		expect(found.length).toBe(new Set(drawing.texts.map(({ face }) => face)).size);
		for (const font of found) {
			expect(font).toMatchObject({ embedded: true, subset: true, unicode: true });
			expect(font.name).toMatch(/^[A-Z]{6}\+(SourceSerif4|SofiaSansSemiCondensed)-/);
		}
		expect(pdfImages(pdf)).toBe(0);
	});

	it('gives back names in Latin, Greek and Cyrillic, each once although it has a halo', async () => {
		const coverage = statesCoverage();
		const names = ['Ελλάδα', 'Беларусь', 'Łódź', 'Åland', 'Ñuñoa', 'Київ', 'Ήπειρος', 'Čáslav'];
		coverage.names = coverage.names.map((name, i) => names[(i % 48) >> 1] ?? name);
		const { drawing, about } = sourceOf(coverage);
		for (const text of drawing.texts) if (text.layer === 'label') text.halo = '#ffffff';
		const words = pdfText(await exportPdf({ drawing, about, fonts }, all)).split(/\s+/);
		for (const name of names) {
			const set = drawing.texts.filter(({ text }) => text.split(' ').includes(name)).length;
			expect(words.filter((word) => word === name).length, name).toBe(set);
		}
		expect(drawing.texts.some(({ text }) => text === 'Ελλάδα')).toBe(true);
		expect(drawing.texts.some(({ text }) => text === 'Беларусь')).toBe(true);
	});

	it('has every line of lettering and collar as text', async () => {
		const { drawing, about } = sourceOf();
		const text = pdfText(await exportPdf({ drawing, about, fonts }, all));
		for (const line of drawing.texts) expect(text).toContain(line.text);
	});

	it('has a heading, a figure for the map and paragraphs for what stands beside it', async () => {
		const lines = pdfStructure(await exportPdf(sourceOf(), all))
			.trim()
			.split('\n');
		const roles = lines.map((line) => line.trim().split(/[\s"(]/)[0]);
		expect(roles.slice(0, 3)).toEqual(['Document', 'H1', 'Figure']);
		expect(roles.filter((role) => role === 'Figure').length).toBe(1);
		expect(roles.filter((role) => role === 'P').length).toBeGreaterThan(3);
	});

	it('has its layers by name, each begun and ended, or none', async () => {
		const names = (pdf: Uint8Array) =>
			[...latin1(pdf).matchAll(/\/Type \/OCG\n\/Name \(([^)]*)\)/g)].map(([, name]) => name);
		const source = sourceOf();
		expect(names(await exportPdf(source, all))).toEqual([
			// the names' halos lie under the borders
			...['Fills', 'Names', 'Borders of regions', 'Outer borders', 'Leader lines', 'Collar'],
		]);
		expect(names(await exportPdf(source, { layers: false }))).toEqual([]);
	});

	it('is the same bytes every time', async () => {
		const again = await exportPdf(sourceOf(), all);
		expect(Buffer.compare(again, await exportPdf(sourceOf(), all))).toBe(0);
	});

	it('is drawn where nothing is coloured yet', async () => {
		const pdf = await exportPdf(sourceOf(statesCoverage(), { colouring: null }), all);
		expect(pdfInfo(pdf).Pages).toBe('1');
		expect(pdfText(pdf)).toContain('Texas');
	});
});

describe('hostile texts', () => {
	it('stay texts in the page, in its metadata and in its structure', async () => {
		const source = hostileSource();
		const pdf = await exportPdf(source, all);
		expect(pdfInfo(pdf).Title).toBe(cleanText(source.about.title));
		expect(pdfInfo(pdf).Author).toBe('<script>alert(1)</script>');
		expect(latin1(pdf)).not.toMatch(/\/(JavaScript|OpenAction|AA|Launch|URI|EmbeddedFiles)\b/);
		expect(pdfText(pdf).length).toBeGreaterThan(100);
		expect(metadataTexts(pdfMetadata(pdf))).toContain(cleanText(source.about.title));
	});

	it('make well-formed metadata, whatever they are', async () => {
		const coverage = statesCoverage();
		const { drawing, about } = sourceOf(coverage, { layout: { ...layout, labels: false } });
		const text = fc.string({ unit: 'binary', maxLength: 40 });
		await fc.assert(
			fc.asyncProperty(text, text, async (title, author) => {
				const small = { ...drawing, fills: [], lines: [], texts: [] };
				const pdf = await exportPdf(
					{ drawing: small, about: { ...about, title, author }, fonts },
					all,
				);
				const texts = metadataTexts(pdfMetadata(pdf));
				expect(texts).toContain(cleanText(title) || 'Merestone');
				if (cleanText(author)) expect(texts).toContain(cleanText(author));
			}),
			{ numRuns: 25 },
		);
	});
});

/** Texts of an XML document by saxes 6.0.0, which throws on what is not well-formed. */
function metadataTexts(xml: string): string[] {
	const texts: string[] = [];
	const parser = new SaxesParser();
	parser.on('error', (error) => {
		throw error;
	});
	parser.on('text', (text) => void texts.push(text));
	parser.write(xml.slice(xml.indexOf('<x:xmpmeta'), xml.indexOf('<?xpacket end'))).close();
	return texts;
}
