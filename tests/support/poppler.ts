/** PDF files as Debian's poppler-utils read them: programs that had no part in writing them. */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PNG } from 'pngjs';

function withFile<T>(pdf: Uint8Array, read: (file: string, folder: string) => T): T {
	const folder = mkdtempSync(join(tmpdir(), 'merestone-pdf-'));
	try {
		const file = join(folder, 'sheet.pdf');
		writeFileSync(file, pdf);
		return read(file, folder);
	} finally {
		rmSync(folder, { recursive: true });
	}
}

/** What a program says; throws where it fails or complains of the file. */
function said(program: string, ...options: string[]): string {
	const { status, stdout, stderr, error } = spawnSync(program, options, {
		encoding: 'utf8',
		maxBuffer: 64 * 1024 * 1024,
	});
	if (error) throw error;
	if (status !== 0 || stderr.trim() !== '') throw new Error(`${program}: ${stderr}`);
	return stdout;
}

export const pdfText = (pdf: Uint8Array): string =>
	withFile(pdf, (file) => said('pdftotext', '-raw', '-enc', 'UTF-8', file, '-'));

/** Title, page size and the like, by their headings. */
export const pdfInfo = (pdf: Uint8Array): Record<string, string> =>
	withFile(pdf, (file) =>
		Object.fromEntries(
			said('pdfinfo', '-enc', 'UTF-8', file)
				.split('\n')
				.filter((line) => line.includes(':'))
				.map((line) => [
					line.slice(0, line.indexOf(':')),
					line.slice(line.indexOf(':') + 1).trim(),
				]),
		),
	);

export const pdfMetadata = (pdf: Uint8Array): string =>
	withFile(pdf, (file) => said('pdfinfo', '-meta', file));

/** The structure tree, an element a line, set in by its depth. */
export const pdfStructure = (pdf: Uint8Array): string =>
	withFile(pdf, (file) => said('pdfinfo', '-struct', file));

export interface PdfFont {
	name: string;
	type: string;
	embedded: boolean;
	subset: boolean;
	unicode: boolean;
}

export const pdfFonts = (pdf: Uint8Array): PdfFont[] =>
	withFile(pdf, (file) =>
		said('pdffonts', file)
			.split('\n')
			.slice(2)
			.filter((line) => line.trim() !== '')
			.map((line) => {
				const [name, ...rest] = line.trim().split(/\s+/);
				const [embedded, subset, unicode] = rest.slice(-5, -2).map((word) => word === 'yes');
				return { name, type: rest.slice(0, -6).join(' '), embedded, subset, unicode };
			}),
	);

/** How many pictures of pixels the file holds. */
export const pdfImages = (pdf: Uint8Array): number =>
	withFile(pdf, (file) => said('pdfimages', '-list', file).trim().split('\n').length - 2);

/** The page in pixels. */
export const pdfPicture = (pdf: Uint8Array, dpi: number): PNG =>
	withFile(pdf, (file, folder) => {
		said('pdftoppm', '-r', String(dpi), '-png', '-singlefile', file, join(folder, 'page'));
		return PNG.sync.read(readFileSync(join(folder, 'page.png')));
	});
