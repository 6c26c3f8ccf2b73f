import type { Finding } from '../finding.ts';

/** Language driver bytes of dBASE whose code page the platform can decode. */
const byLanguageByte: Record<number, string> = {
	0x03: 'windows-1252',
	0x13: 'shift_jis',
	0x26: 'ibm866',
	0x4d: 'gbk',
	0x4e: 'euc-kr',
	0x4f: 'big5',
	0x57: 'windows-1252',
	0x58: 'windows-1252',
	0x59: 'windows-1252',
	0x65: 'ibm866',
	0x7b: 'shift_jis',
	0x7c: 'windows-874',
	0xc8: 'windows-1250',
	0xc9: 'windows-1251',
	0xca: 'windows-1254',
	0xcb: 'windows-1253',
	0xcc: 'windows-1257',
};

/**
 * The encoding of a table's texts: what the .cpg file says, else the language byte, else UTF-8 where
 * all texts are valid UTF-8, else windows-1252 with a finding. A claim of UTF-8 that does not hold is
 * not believed.
 */
export function textEncoding(
	cpg: string | null,
	languageByte: number,
	texts: () => Iterable<Uint8Array>,
): { encoding: string; findings: Finding[] } {
	const claimed = (cpg && decoderName(cpg)) ?? byLanguageByte[languageByte] ?? null;
	if (claimed && claimed !== 'utf-8') return { encoding: claimed, findings: [] };
	if (isUtf8(texts())) return { encoding: 'utf-8', findings: [] };
	const message = claimed
		? 'The names are said to be in UTF-8 but are not; they were read as windows-1252. Check letters with accents.'
		: 'The file does not say how its names are written; they were read as windows-1252. Check letters with accents.';
	return {
		encoding: 'windows-1252',
		findings: [{ code: 'encoding-guessed', severity: 'warning', message, regions: [], at: null }],
	};
}

/** The platform's name for what a .cpg file says: "1252", "ANSI 1252", "ISO 88591", "UTF-8", "65001". */
function decoderName(cpg: string): string | null {
	const label = cpg.trim().toLowerCase();
	const iso = /^(?:iso[\s_-]*)?8859[\s_-]*(\d{1,2})$/.exec(label);
	const number = /^(?:cp|ansi|oem|windows|ms)?[\s_-]*(\d{3,5})$/.exec(label);
	const named: Record<string, string> = {
		'65001': 'utf-8',
		'932': 'shift_jis',
		'936': 'gbk',
		'949': 'euc-kr',
		'950': 'big5',
		'866': 'ibm866',
		'874': 'windows-874',
	};
	const wanted = iso
		? `iso-8859-${iso[1]}`
		: number
			? (named[number[1]] ?? `windows-${number[1]}`)
			: label;
	try {
		return new TextDecoder(wanted).encoding;
	} catch {
		return null;
	}
}

function isUtf8(texts: Iterable<Uint8Array>): boolean {
	const strict = new TextDecoder('utf-8', { fatal: true });
	for (const text of texts) {
		try {
			strict.decode(text);
		} catch {
			return false;
		}
	}
	return true;
}
