import { TableRefusal } from './refusal.ts';

const compoundFile = [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1];
const zip = [0x50, 0x4b];
const headBytes = 4096;

const startsWith = (bytes: Uint8Array, magic: number[]) => magic.every((b, i) => bytes[i] === b);

/**
 * Whether the bytes are a workbook or text, by what they begin with, never by a file's name. Files of other
 * kinds that come under these names are refused, each with a sentence.
 */
export function detectFormat(bytes: Uint8Array): 'csv' | 'xlsx' {
	if (bytes.length === 0) throw new TableRefusal('empty-file', 'The file is empty.');
	if (startsWith(bytes, zip)) return 'xlsx';
	if (startsWith(bytes, compoundFile)) throw oldOrLocked(bytes);
	refuseMarkup(bytes);
	return 'csv';
}

/** A workbook with a password is the same kind of container as one of the years before 2007. */
function oldOrLocked(bytes: Uint8Array): TableRefusal {
	if (holdsWide(bytes, 'EncryptedPackage')) {
		return new TableRefusal(
			'encrypted',
			'The workbook is locked with a password. Save it without one.',
		);
	}
	const message =
		'This is a workbook of the old binary kind (.xls). Save it as .xlsx or as CSV and take that.';
	return new TableRefusal('old-workbook', message);
}

/** Whether the text stands in the bytes in UTF-16, as names in a compound file do. */
function holdsWide(bytes: Uint8Array, text: string): boolean {
	const wanted = [...text].flatMap((c) => [c.charCodeAt(0), 0]);
	for (let at = 0; at + wanted.length <= bytes.length; at++) {
		let i = 0;
		while (i < wanted.length && bytes[at + i] === wanted[i]) i++;
		if (i === wanted.length) return true;
	}
	return false;
}

function refuseMarkup(bytes: Uint8Array): void {
	const head = new TextDecoder('latin1').decode(bytes.subarray(0, headBytes));
	const text = head
		.replace(/^\u00ef\u00bb\u00bf/, '')
		.replaceAll('\0', '')
		.trimStart()
		.toLowerCase();
	if (/^(<!doctype html|<html|<head|<body|<table|<meta)/.test(text)) {
		const message =
			'This is a web page, whatever its name says. Open it in a spreadsheet program and save it as .xlsx or CSV.';
		throw new TableRefusal('web-page', message);
	}
	if (text.startsWith('<?xml')) {
		const page = text.includes('<html');
		if (page) throw new TableRefusal('web-page', 'This is a web page, whatever its name says.');
		throw new TableRefusal('xml', 'This is an XML file. Save the table as .xlsx or as CSV.');
	}
	if (text.startsWith('%pdf')) {
		throw new TableRefusal('not-text', 'This is a PDF document. Take the table it was made from.');
	}
	refuseBinary(bytes);
}

/** Text has no control characters but tabs and line ends; UTF-16 has zero bytes on one side only. */
function refuseBinary(bytes: Uint8Array): void {
	const zeros = [0, 0];
	let control = 0;
	const length = Math.min(bytes.length, headBytes);
	for (let i = 0; i < length; i++) {
		if (bytes[i] === 0) zeros[i & 1]++;
		else if (bytes[i] < 9 || (bytes[i] > 13 && bytes[i] < 32)) control++;
	}
	const marked =
		(bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
	const mixedZeros = zeros[0] > 0 && zeros[1] > 0;
	if ((mixedZeros && !marked) || control * 20 > length) {
		throw new TableRefusal('not-text', 'The file is neither text nor a workbook.');
	}
}
