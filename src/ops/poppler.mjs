import path from 'node:path';
import { aptInstall, executable } from './debian.mjs';
import { Explained } from './say.mjs';

/** What the tests read PDF files with, and compare pictures of them by. */
const programs = ['pdftotext', 'pdffonts', 'pdfinfo', 'pdfimages', 'pdftoppm'];

/** Sees to it that the tests can read PDF files with programs that had no part in writing them. */
export function ensurePoppler() {
	if (missing().length === 0) return;
	aptInstall(['poppler-utils'], "the PDF readers of Debian's poppler-utils");
	const still = missing();
	if (still.length > 0) throw new Explained(`${still.join(', ')} cannot be found on the path.`);
}

function missing() {
	const folders = (process.env.PATH ?? '').split(path.delimiter).concat('/usr/bin');
	return programs.filter(
		(program) => !folders.some((folder) => executable(path.join(folder, program))),
	);
}
